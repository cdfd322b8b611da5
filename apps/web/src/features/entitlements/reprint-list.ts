import type { ShelfKit } from '@windchest/contracts';

type ShelfPart = ShelfKit['parts'][number];

export type ReprintAdvice = 'print' | 'if-it-troubles' | 'not-asked' | 'dropped';

/** What to do about a part that differs; undefined for one that stays as it is. */
export function adviceFor(part: ShelfPart): ReprintAdvice | undefined {
  if (part.difference === 'dropped') return 'dropped';
  if (part.difference === 'new' || part.mark === 'reprint needed') return 'print';
  if (part.mark === 'reprint if it troubles you') return 'if-it-troubles';
  if (part.difference === 'changed') return 'not-asked';
  // The same part, but another number of it: told in words only.
  return /\d → \d/.test(part.whatDiffers) ? 'not-asked' : undefined;
}

export interface ReprintCount {
  /** Parts of the newer revision. */
  all: number;
  print: number;
  ifItTroubles: number;
  same: number;
}

export function countReprints(parts: readonly ShelfPart[]): ReprintCount {
  const count = { all: 0, print: 0, ifItTroubles: 0, same: 0 };
  for (const part of parts) {
    const advice = adviceFor(part);
    if (advice === 'dropped') continue;
    count.all += 1;
    if (advice === 'print') count.print += 1;
    else if (advice === 'if-it-troubles') count.ifItTroubles += 1;
    else if (advice === undefined) count.same += 1;
  }
  return count;
}

export interface ReprintRow {
  codes: string[];
  name: string;
  /** Which of it to print; null where it comes in one, or nothing is chosen. */
  clearance: ShelfPart['clearance'];
  /** Of all its codes together. */
  pieces: number;
  advice: ReprintAdvice;
  whatDiffers: string;
  reason: string;
}

const order: readonly ReprintAdvice[] = ['print', 'if-it-troubles', 'not-asked', 'dropped'];

/** The parts that differ, most urgent first; parts of one name that differ alike share a row. */
export function reprintRows(parts: readonly ShelfPart[]): ReprintRow[] {
  const rows = new Map<string, ReprintRow>();
  for (const part of parts) {
    const advice = adviceFor(part);
    if (!advice) continue;
    const { code, name, clearance, quantity, whatDiffers, reason } = part;
    const alike = JSON.stringify([name, clearance, advice, whatDiffers, reason]);
    const row = rows.get(alike);
    if (row) {
      row.codes.push(code);
      row.pieces += quantity;
    } else rows.set(alike, { codes: [code], name, clearance, pieces: quantity, advice, whatDiffers, reason });
  }
  return [...rows.values()].sort((a, b) => order.indexOf(a.advice) - order.indexOf(b.advice));
}
