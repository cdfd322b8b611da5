import { boundsOf } from './bounds.js';

/** From where a drawing looks at a part: front = along +y, side = from the right along −x, top = down −z. */
export type View = 'front' | 'side' | 'top';

/** For each view: the axes that run right, up and towards the eye, and whether the last one points there. */
const AXES: Readonly<Record<View, { right: number; up: number; near: number; isNearPositive: boolean }>> = {
  front: { right: 0, up: 2, near: 1, isNearPositive: false },
  side: { right: 1, up: 2, near: 0, isNearPositive: true },
  top: { right: 0, up: 1, near: 2, isNearPositive: true },
};

/** Corners as a drawing sees them: x to the right, y down from the top (as in SVG), depth away from the eye. */
export interface Projection {
  readonly widthMm: number;
  readonly heightMm: number;
  /** x, y, depth for each corner, in mm. */
  readonly points: Float64Array;
}

export function project(corners: Float32Array | Float64Array, view: View): Projection {
  const { right, up, near, isNearPositive } = AXES[view];
  const { minMm, maxMm } = boundsOf(corners);
  const points = new Float64Array(corners.length);
  const left = minMm[right]!,
    top = maxMm[up]!;
  const eye = isNearPositive ? maxMm[near]! : minMm[near]!;
  const sign = isNearPositive ? -1 : 1;
  for (let i = 0; i < corners.length; i += 3) {
    points[i] = corners[i + right]! - left;
    points[i + 1] = top - corners[i + up]!;
    points[i + 2] = sign * (corners[i + near]! - eye);
  }
  return { widthMm: maxMm[right]! - left, heightMm: top - minMm[up]!, points };
}
