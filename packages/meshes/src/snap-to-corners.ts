import { columnAt, type DepthBuffer } from './depth-buffer.js';

/** A traced line, some of whose points were moved to true corners of the part. */
export interface SnappedLine {
  readonly points: Float64Array;
  /** 1 where the point is a true corner, 0 where it is a grid point that may be half a cell off. */
  readonly isTrue: Uint8Array;
}

const REACH_CELLS = 1.25;

/** Moves points of traced borders to corners of the part close by, so that straight sides come out exact. */
export class CornerSnapper {
  private readonly cornerAt: Int32Array;
  private readonly xs: number[] = [];
  private readonly ys: number[] = [];

  constructor(private readonly buffer: DepthBuffer) {
    this.cornerAt = new Int32Array(buffer.columns * buffer.rows).fill(-1);
  }

  add(xMm: number, yMm: number): void {
    const cell = this.cellOf(columnAt(this.buffer, xMm), columnAt(this.buffer, yMm));
    if (this.cornerAt[cell]! >= 0) return;
    this.cornerAt[cell] = this.xs.length;
    this.xs.push(xMm);
    this.ys.push(yMm);
  }

  snap(line: Float64Array): SnappedLine {
    const points: number[] = [];
    const isTrue: number[] = [];
    let last = -1;
    for (let i = 0; i < line.length; i += 2) {
      const corner = this.nearest(line[i]!, line[i + 1]!);
      if (corner >= 0 && corner === last) continue;
      last = corner;
      points.push(corner < 0 ? line[i]! : this.xs[corner]!, corner < 0 ? line[i + 1]! : this.ys[corner]!);
      isTrue.push(corner < 0 ? 0 : 1);
    }
    return { points: Float64Array.from(points), isTrue: Uint8Array.from(isTrue) };
  }

  private nearest(xMm: number, yMm: number): number {
    const { buffer } = this;
    const column = columnAt(buffer, xMm),
      row = columnAt(buffer, yMm);
    let best = -1;
    let bestMm = REACH_CELLS * buffer.cellMm;
    for (let r = Math.floor(row) - 2; r <= row + 2; r += 1) {
      for (let c = Math.floor(column) - 2; c <= column + 2; c += 1) {
        if (r < 0 || c < 0 || r >= buffer.rows || c >= buffer.columns) continue;
        const corner = this.cornerAt[r * buffer.columns + c]!;
        if (corner < 0) continue;
        const distanceMm = Math.hypot(this.xs[corner]! - xMm, this.ys[corner]! - yMm);
        if (distanceMm < bestMm) {
          best = corner;
          bestMm = distanceMm;
        }
      }
    }
    return best;
  }

  private cellOf(column: number, row: number): number {
    return Math.floor(row) * this.buffer.columns + Math.floor(column);
  }
}
