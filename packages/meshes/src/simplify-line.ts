/**
 * Leaves out points of a line that lie near the chord of those kept (Douglas & Peucker, 1973). Each point
 * may stray by its own allowance.
 *
 * @param line x, y in turn, in mm.
 * @param allowanceMm how far each point may lie from the simplified line.
 */
export function simplifyLine(line: Float64Array, allowanceMm: (point: number) => number): number[] {
  const points = line.length / 2;
  if (points < 3) return Array.from({ length: points }, (_, i) => i);
  const isKept = new Uint8Array(points);
  isKept[0] = 1;
  isKept[points - 1] = 1;
  const spans: [number, number][] = [[0, points - 1]];
  for (let span = spans.pop(); span !== undefined; span = spans.pop()) {
    const [from, to] = span;
    let worst = 1;
    let split = -1;
    for (let i = from + 1; i < to; i += 1) {
      const excess = distanceToChord(line, i, from, to) / allowanceMm(i);
      if (excess > worst) {
        worst = excess;
        split = i;
      }
    }
    if (split < 0) continue;
    isKept[split] = 1;
    spans.push([from, split], [split, to]);
  }
  return Array.from(isKept.keys()).filter((i) => isKept[i] === 1);
}

/** The same for a closed loop, which is opened at its first point and at the one farthest from it. */
export function simplifyLoop(loop: Float64Array, allowanceMm: (point: number) => number): number[] {
  const points = loop.length / 2;
  let far = 0;
  let farthest = -1;
  for (let i = 1; i < points; i += 1) {
    const distance = Math.hypot(loop[2 * i]! - loop[0]!, loop[2 * i + 1]! - loop[1]!);
    if (distance > farthest) {
      farthest = distance;
      far = i;
    }
  }
  const there = simplifyLine(loop.slice(0, 2 * far + 2), allowanceMm);
  const rest = new Float64Array(2 * (points - far) + 2);
  rest.set(loop.subarray(2 * far));
  rest.set(loop.subarray(0, 2), rest.length - 2);
  const back = simplifyLine(rest, (i) => allowanceMm((far + i) % points)).map((i) => far + i);
  return [...there, ...back.slice(1, -1)];
}

function distanceToChord(line: Float64Array, point: number, from: number, to: number): number {
  const x = line[2 * point]! - line[2 * from]!,
    y = line[2 * point + 1]! - line[2 * from + 1]!;
  const dx = line[2 * to]! - line[2 * from]!,
    dy = line[2 * to + 1]! - line[2 * from + 1]!;
  const squared = dx * dx + dy * dy;
  const t = squared === 0 ? 0 : Math.min(1, Math.max(0, (x * dx + y * dy) / squared));
  return Math.hypot(x - t * dx, y - t * dy);
}
