import type { Segments } from './sweep.js';
import type { Grid } from './inside-rows.js';

/** Taken out of the loops: some hosts look globals up slowly. */
const { ceil, floor, max, min, sqrt } = Math;

/**
 * Distance in mm from each cell's centre to the nearest contour: positive in the solid, negative outside.
 * Near the contours it is exact; further in, each cell asks only the segments its neighbours found nearest
 * (vector distance transform, after Danielsson 1980, with segments in place of points).
 */
export function depthField(segments: Segments, inside: Uint8Array, grid: Grid): Float32Array {
  const { columns, rows } = grid;
  const squared = new Float32Array(columns * rows).fill(Infinity);
  const nearest = new Int32Array(columns * rows).fill(-1);
  seed(segments, grid, squared, nearest);

  const ask = (cell: number, neighbour: number, x: number, y: number): void => {
    const segment = nearest[neighbour]!;
    if (segment < 0 || segment === nearest[cell]) return;
    const distance = squaredDistance(segments, segment, x, y);
    if (distance < squared[cell]!) {
      squared[cell] = distance;
      nearest[cell] = segment;
    }
  };
  const sweepRow = (row: number, before: number): void => {
    const y = grid.frontMm + row * grid.cellMm;
    const start = row * columns;
    for (let column = 0; column < columns; column += 1) {
      const cell = start + column;
      const x = grid.leftMm + column * grid.cellMm;
      if (before !== 0) {
        ask(cell, cell + before, x, y);
        if (column > 0) ask(cell, cell + before - 1, x, y);
        if (column < columns - 1) ask(cell, cell + before + 1, x, y);
      }
      if (column > 0) ask(cell, cell - 1, x, y);
    }
    for (let column = columns - 2; column >= 0; column -= 1) {
      ask(start + column, start + column + 1, grid.leftMm + column * grid.cellMm, y);
    }
  };
  for (let row = 0; row < rows; row += 1) sweepRow(row, row > 0 ? -columns : 0);
  for (let row = rows - 1; row >= 0; row -= 1) sweepRow(row, row < rows - 1 ? columns : 0);

  for (let cell = 0; cell < squared.length; cell += 1) {
    const distance = sqrt(squared[cell]!);
    squared[cell] = inside[cell] === 1 ? distance : -distance;
  }
  return squared;
}

/** Gives every cell that a segment passes, and its neighbours, their distance to it. */
function seed(segments: Segments, grid: Grid, squared: Float32Array, nearest: Int32Array): void {
  const { columns, rows, cellMm, leftMm, frontMm } = grid;
  for (let s = 0; s < segments.length; s += 4) {
    const x1 = segments[s]!;
    const y1 = segments[s + 1]!;
    const dx = segments[s + 2]! - x1;
    const dy = segments[s + 3]! - y1;
    const bottom = max(0, ceil((min(y1, y1 + dy) - frontMm) / cellMm - 1));
    const top = min(rows - 1, floor((max(y1, y1 + dy) - frontMm) / cellMm + 1));
    for (let row = bottom; row <= top; row += 1) {
      const y = frontMm + row * cellMm;
      const [low, high] = stretchOf(x1, y1, dx, dy, y - cellMm, y + cellMm);
      const left = max(0, ceil((low - leftMm) / cellMm - 1));
      const right = min(columns - 1, floor((high - leftMm) / cellMm + 1));
      for (let column = left; column <= right; column += 1) {
        const cell = row * columns + column;
        const distance = squaredDistance(segments, s, leftMm + column * cellMm, y);
        if (distance >= squared[cell]!) continue;
        squared[cell] = distance;
        nearest[cell] = s;
      }
    }
  }
}

/** The x range of a segment between two heights. */
function stretchOf(
  x1: number,
  y1: number,
  dx: number,
  dy: number,
  low: number,
  high: number,
): [number, number] {
  let from = 0;
  let to = 1;
  if (dy !== 0) {
    const a = (low - y1) / dy;
    const b = (high - y1) / dy;
    from = min(1, max(0, min(a, b)));
    to = min(1, max(0, max(a, b)));
  }
  const a = x1 + from * dx;
  const b = x1 + to * dx;
  return a < b ? [a, b] : [b, a];
}

function squaredDistance(segments: Segments, s: number, x: number, y: number): number {
  const x1 = segments[s]!;
  const y1 = segments[s + 1]!;
  const dx = segments[s + 2]! - x1;
  const dy = segments[s + 3]! - y1;
  const length = dx * dx + dy * dy;
  const along = length > 0 ? ((x - x1) * dx + (y - y1) * dy) / length : 0;
  const share = along < 0 ? 0 : along > 1 ? 1 : along;
  const ex = x - x1 - share * dx;
  const ey = y - y1 - share * dy;
  return ex * ex + ey * ey;
}
