import type { ReprintAdvice, ReprintPart } from '@windchest/contracts';

export interface ReprintCount {
  /** Parts of the wanted revision. */
  all: number;
  print: number;
  ifItTroubles: number;
  same: number;
}

export function countReprints(parts: readonly ReprintPart[]): ReprintCount {
  const of = (...advice: (ReprintAdvice | null)[]) =>
    parts.filter((part) => advice.includes(part.advice)).length;
  return {
    all: parts.length - of('dropped'),
    print: of('print'),
    ifItTroubles: of('if-it-troubles'),
    same: of(null),
  };
}

/** Pieces of all parts together: to print in any case, and besides. */
export const piecesOf = (parts: readonly ReprintPart[]): { print: number; optional: number } => ({
  print: parts.reduce((sum, part) => sum + part.print, 0),
  optional: parts.reduce((sum, part) => sum + part.optional, 0),
});

export interface ReprintRow extends Pick<ReprintPart, 'name' | 'clearance' | 'whatDiffers' | 'steps'> {
  codes: string[];
  /** Of all its codes together. */
  pieces: number;
  spare: number;
  advice: ReprintAdvice;
}

const order: readonly ReprintAdvice[] = ['print', 'if-it-troubles', 'not-asked', 'fewer', 'dropped'];

/** The parts that differ, most urgent first; parts of one name that differ alike share a row. */
export function reprintRows(parts: readonly ReprintPart[]): ReprintRow[] {
  const rows = new Map<string, ReprintRow>();
  for (const { code, name, clearance, advice, whatDiffers, steps, print, optional, spare } of parts) {
    if (!advice) continue;
    const alike = JSON.stringify([name, clearance, advice, whatDiffers, steps]);
    const row = rows.get(alike) ?? {
      codes: [],
      name,
      clearance,
      advice,
      whatDiffers,
      steps,
      pieces: 0,
      spare: 0,
    };
    row.codes.push(code);
    row.pieces += print + optional;
    row.spare += spare;
    rows.set(alike, row);
  }
  return [...rows.values()].sort((a, b) => order.indexOf(a.advice) - order.indexOf(b.advice));
}
