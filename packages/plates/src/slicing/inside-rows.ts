import type { Segments } from './sweep.js';

/** Taken out of the loops: some hosts look globals up slowly. */
const { ceil, max, min } = Math;

export interface Grid {
  readonly columns: number;
  readonly rows: number;
  readonly cellMm: number;
  /** Centre of cell 0, 0. */
  readonly leftMm: number;
  readonly frontMm: number;
}

export interface Inside {
  /** 1 for cells whose centre lies in the solid. */
  readonly cells: Uint8Array;
  /** Some rows of the contours did not close. */
  readonly hasGaps: boolean;
  /** Shells run into one another somewhere. */
  readonly hasOverlap: boolean;
}

/**
 * Marks the cells inside the contours, row by row, by the winding number (so that shells may overlap and the
 * whole may be inside out); a row that does not close falls back to counting crossings by twos.
 */
export function markInside(segments: Segments, grid: Grid): Inside {
  const cells = new Uint8Array(grid.columns * grid.rows);
  const { starts, crossings, turns } = crossingsByRow(segments, grid);
  let hasGaps = false;
  let hasOverlap = false;
  for (let row = 0; row < grid.rows; row += 1) {
    const from = starts[row]!;
    const to = starts[row + 1]!;
    if (from === to) continue;
    sortTogether(crossings, turns, from, to);
    let total = 0;
    for (let i = from; i < to; i += 1) total += turns[i]!;
    if (total !== 0) hasGaps = true;
    let winding = 0;
    for (let i = from; i + 1 < to; i += 1) {
      winding += total === 0 ? turns[i]! : winding === 0 ? 1 : -1;
      if (winding === 0) continue;
      if (winding > 1 || winding < -1) hasOverlap = true;
      const left = max(0, ceil((crossings[i]! - grid.leftMm) / grid.cellMm));
      const right = min(grid.columns, ceil((crossings[i + 1]! - grid.leftMm) / grid.cellMm));
      if (left < right) cells.fill(1, row * grid.columns + left, row * grid.columns + right);
    }
  }
  return { cells, hasGaps, hasOverlap };
}

function crossingsByRow(segments: Segments, { rows, cellMm, frontMm }: Grid) {
  const starts = new Int32Array(rows + 1);
  const firstRow = (y: number): number => max(0, ceil((y - frontMm) / cellMm));
  for (let s = 0; s < segments.length; s += 4) {
    const y1 = segments[s + 1]!;
    const y2 = segments[s + 3]!;
    const end = min(rows, firstRow(max(y1, y2)));
    for (let row = firstRow(min(y1, y2)); row < end; row += 1) starts[row + 1]! += 1;
  }
  for (let row = 0; row < rows; row += 1) starts[row + 1]! += starts[row]!;
  const crossings = new Float64Array(starts[rows]!);
  const turns = new Int8Array(starts[rows]!);
  const next = starts.slice();
  for (let s = 0; s < segments.length; s += 4) {
    const y1 = segments[s + 1]!;
    const y2 = segments[s + 3]!;
    const end = min(rows, firstRow(max(y1, y2)));
    for (let row = firstRow(min(y1, y2)); row < end; row += 1) {
      const share = (frontMm + row * cellMm - y1) / (y2 - y1);
      const slot = next[row]!++;
      crossings[slot] = segments[s]! + share * (segments[s + 2]! - segments[s]!);
      turns[slot] = y2 > y1 ? 1 : -1;
    }
  }
  return { starts, crossings, turns };
}

/** Insertion sort: a row has few crossings, and its two arrays move together. */
function sortTogether(keys: Float64Array, followers: Int8Array, from: number, to: number): void {
  for (let i = from + 1; i < to; i += 1) {
    const key = keys[i]!;
    const follower = followers[i]!;
    let at = i;
    while (at > from && keys[at - 1]! > key) {
      keys[at] = keys[at - 1]!;
      followers[at] = followers[at - 1]!;
      at -= 1;
    }
    keys[at] = key;
    followers[at] = follower;
  }
}
