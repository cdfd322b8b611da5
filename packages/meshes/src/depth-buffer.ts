import type { Projection } from './projection.js';

const BORDER = 2;
/** The depth of cells where there is nothing. */
export const NOTHING = Infinity;

/** What of a part lies nearest to the eye at each cell of a square grid. */
export interface DepthBuffer {
  readonly columns: number;
  readonly rows: number;
  readonly cellMm: number;
  readonly depths: Float32Array;
}

export function columnAt(buffer: DepthBuffer, xMm: number): number {
  return xMm / buffer.cellMm + BORDER;
}

export function toMm(buffer: DepthBuffer, gridPosition: number): number {
  return (gridPosition - BORDER) * buffer.cellMm;
}

/**
 * Draws all triangles into a depth buffer, sampling at cell centres.
 *
 * @param resolution cells along the longer side of the drawing.
 */
export function drawDepths(projection: Projection, resolution: number): DepthBuffer {
  const cellMm = Math.max(projection.widthMm, projection.heightMm) / resolution;
  const columns = Math.ceil(projection.widthMm / cellMm) + 2 * BORDER;
  const rows = Math.ceil(projection.heightMm / cellMm) + 2 * BORDER;
  const depths = new Float32Array(columns * rows).fill(NOTHING);
  const { points } = projection;
  for (let o = 0; o < points.length; o += 9) {
    // Cell centres have whole coordinates after the half is taken off.
    const ax = points[o]! / cellMm + BORDER - 0.5,
      ay = points[o + 1]! / cellMm + BORDER - 0.5,
      az = points[o + 2]!;
    const bx = points[o + 3]! / cellMm + BORDER - 0.5,
      by = points[o + 4]! / cellMm + BORDER - 0.5,
      bz = points[o + 5]!;
    const cx = points[o + 6]! / cellMm + BORDER - 0.5,
      cy = points[o + 7]! / cellMm + BORDER - 0.5,
      cz = points[o + 8]!;
    const doubleArea = (bx - ax) * (cy - ay) - (by - ay) * (cx - ax);
    if (Math.abs(doubleArea) < 1e-12) continue;
    const slopeX = ((bz - az) * (cy - ay) - (cz - az) * (by - ay)) / doubleArea;
    const slopeY = ((cz - az) * (bx - ax) - (bz - az) * (cx - ax)) / doubleArea;
    const lastRow = Math.floor(Math.max(ay, by, cy));
    for (let row = Math.ceil(Math.min(ay, by, cy)); row <= lastRow; row += 1) {
      const onAb = crossing(row, ax, ay, bx, by),
        onBc = crossing(row, bx, by, cx, cy),
        onCa = crossing(row, cx, cy, ax, ay);
      // A row crosses two sides, or three at a corner; NaN marks the one it misses.
      const from = Math.min(or(onAb, onBc), or(onBc, onCa), or(onCa, onAb));
      const to = Math.max(or(onAb, onBc), or(onBc, onCa), or(onCa, onAb));
      const last = Math.floor(to);
      for (let column = Math.ceil(from); column <= last; column += 1) {
        const depth = az + slopeX * (column - ax) + slopeY * (row - ay);
        const at = row * columns + column;
        if (depth < depths[at]!) depths[at] = depth;
      }
    }
  }
  return { columns, rows, cellMm, depths };
}

/** Where a row meets a side, as a column; NaN where it does not. */
function crossing(row: number, x0: number, y0: number, x1: number, y1: number): number {
  const isCrossed = y0 < y1 ? row >= y0 && row <= y1 : row >= y1 && row <= y0;
  return isCrossed && y0 !== y1 ? x0 + ((row - y0) * (x1 - x0)) / (y1 - y0) : NaN;
}

function or(value: number, otherwise: number): number {
  return value === value ? value : otherwise;
}
