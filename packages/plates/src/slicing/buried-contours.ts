import type { Segments } from './sweep.js';

/** Contours are tested in pieces this long, where two shells cross. */
const PIECE_MM = 0.5;
const SIDE_STEP_MM = 1e-3;
const BUCKET_MM = 0.5;

/**
 * Where shells run into one another, slicers print their union: leaves out the pieces of contour that lie
 * inside another shell, with solid on both sides.
 */
export function withoutBuried(segments: Segments): { segments: Segments; contourMm: number } {
  const windingAt = windingTest(segments);
  let contourMm = 0;
  const kept: number[] = [];
  for (let s = 0; s < segments.length; s += 4) {
    const dx = segments[s + 2]! - segments[s]!;
    const dy = segments[s + 3]! - segments[s + 1]!;
    const length = Math.hypot(dx, dy);
    if (length === 0) continue;
    const pieces = Math.max(1, Math.ceil(length / PIECE_MM));
    const sideX = (-dy / length) * SIDE_STEP_MM;
    const sideY = (dx / length) * SIDE_STEP_MM;
    for (let piece = 0; piece < pieces; piece += 1) {
      const from = piece / pieces;
      const to = (piece + 1) / pieces;
      const x = segments[s]! + ((from + to) / 2) * dx;
      const y = segments[s + 1]! + ((from + to) / 2) * dy;
      const left = windingAt(x + sideX, y + sideY);
      const right = windingAt(x - sideX, y - sideY);
      if (left === right || (left !== 0 && right !== 0)) continue;
      // Contours that coincide turn the winding by more than one: together they count once.
      contourMm += length / pieces / Math.abs(left - right);
      kept.push(segments[s]! + from * dx, segments[s + 1]! + from * dy);
      kept.push(segments[s]! + to * dx, segments[s + 1]! + to * dy);
    }
  }
  return { segments: Float64Array.from(kept), contourMm };
}

/** Winding number of a ray to the left, over the segments that share the point's height. */
function windingTest(segments: Segments): (x: number, y: number) => number {
  const buckets = new Map<number, number[]>();
  for (let s = 0; s < segments.length; s += 4) {
    const y1 = segments[s + 1]!;
    const y2 = segments[s + 3]!;
    const end = Math.floor(Math.max(y1, y2) / BUCKET_MM);
    for (let bucket = Math.floor(Math.min(y1, y2) / BUCKET_MM); bucket <= end; bucket += 1) {
      const list = buckets.get(bucket);
      if (list === undefined) buckets.set(bucket, [s]);
      else list.push(s);
    }
  }
  return (x, y) => {
    let winding = 0;
    for (const s of buckets.get(Math.floor(y / BUCKET_MM)) ?? []) {
      const y1 = segments[s + 1]!;
      const y2 = segments[s + 3]!;
      if (y1 <= y === y2 <= y) continue;
      const at = segments[s]! + ((y - y1) / (y2 - y1)) * (segments[s + 2]! - segments[s]!);
      if (at < x) winding += y2 > y1 ? 1 : -1;
    }
    return winding;
  };
}
