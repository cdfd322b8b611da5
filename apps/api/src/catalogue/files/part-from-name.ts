import type { Clearance } from '@windchest/contracts';

const CODE_AT_START = /^([A-Za-z]{1,3})-([0-9]{1,3})([a-z]?)(?=[\s_.()-]|$)/;
const CLEARANCE = /\((minus|zero|plus|[-−–0+])\)/i;
const clearanceWords: Record<string, Clearance> = {
  minus: 'minus',
  '-': 'minus',
  '−': 'minus',
  '–': 'minus',
  zero: 'zero',
  '0': 'zero',
  plus: 'plus',
  '+': 'plus',
};

export interface PartNaming {
  /** Null where the name starts with none. */
  readonly code: string | null;
  readonly name: string;
  readonly clearance: Clearance;
}

/**
 * Reads a part's code and name from its file's name: `J-01 Locking tongue.stl`, `P-72_pipe.3mf`. A code with
 * `(minus)` or `(plus)` behind it, or the sign in brackets, is that part in another clearance:
 * `J-01 Locking tongue (plus).stl`. A bare sign would not do: many write a hyphen behind the code.
 */
export const partFromName = (fileName: string): PartNaming => {
  const stem = fileName.replace(/\.[A-Za-z0-9]{1,8}$/, '');
  const match = CODE_AT_START.exec(stem);
  const code = match ? `${match[1]!.toUpperCase()}-${match[2]}${match[3]}` : null;
  const behind = match ? stem.slice(match[0].length) : stem;
  const sign = match && CLEARANCE.exec(behind)?.[1];
  const rest = (sign ? behind.replace(CLEARANCE, ' ') : behind)
    .replaceAll('_', ' ')
    .replace(/^[\s.-]+|[\s.-]+$/g, '')
    .replace(/\s+/g, ' ');
  const name = rest === '' ? (code ?? stem) : rest;
  return {
    code,
    name: name.charAt(0).toUpperCase() + name.slice(1, 120),
    clearance: (sign && clearanceWords[sign.toLowerCase()]) || 'zero',
  };
};

/** The lowest `P-nn` that no part has yet. */
export const nextFreeCode = (taken: Iterable<string>): string => {
  const known = new Set(taken);
  for (let number = 1; ; number++) {
    const code = `P-${String(number).padStart(2, '0')}`;
    if (!known.has(code)) return code;
  }
};
