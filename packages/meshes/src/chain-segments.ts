import type { Segment } from './visible-edges.js';

/**
 * Joins segments that end in the same place into long lines. Where more than two meet, the lines end.
 *
 * @param stepMm ends nearer than about this count as the same place.
 * @returns lines as x, y in turn, in mm.
 */
export function chainSegments(segments: readonly Segment[], stepMm: number): Float64Array[] {
  const key = (x: number, y: number): string => `${Math.round(x / stepMm)},${Math.round(y / stepMm)}`;
  const ends = segments.map(([x0, y0, x1, y1]) => [key(x0, y0), key(x1, y1)] as const);
  const at = new Map<string, number[]>();
  ends.forEach((pair, segment) => {
    for (const end of pair) {
      const list = at.get(end);
      if (list === undefined) at.set(end, [segment]);
      else list.push(segment);
    }
  });
  const isUsed = new Uint8Array(segments.length);

  /** Walks on from an end while exactly one other segment continues there. */
  const extend = (segment: number, endIndex: 0 | 1): number[] => {
    const points: number[] = [];
    let place = ends[segment]![endIndex];
    let current = segment;
    for (;;) {
      const meeting = at.get(place)!;
      const next = meeting.length === 2 ? meeting.find((s) => s !== current) : undefined;
      if (next === undefined || isUsed[next] === 1) return points;
      isUsed[next] = 1;
      const leaves = ends[next]![0] === place ? 1 : 0;
      points.push(segments[next]![2 * leaves]!, segments[next]![2 * leaves + 1]!);
      place = ends[next]![leaves];
      current = next;
    }
  };

  const lines: Float64Array[] = [];
  segments.forEach(([x0, y0, x1, y1], segment) => {
    if (isUsed[segment] === 1) return;
    isUsed[segment] = 1;
    const forward = extend(segment, 1);
    const backward = extend(segment, 0);
    const line: number[] = [];
    for (let i = backward.length - 2; i >= 0; i -= 2) line.push(backward[i]!, backward[i + 1]!);
    lines.push(Float64Array.from([...line, x0, y0, x1, y1, ...forward]));
  });
  return lines;
}
