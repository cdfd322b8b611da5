/** Plans: closed outlines in the x–y plane, in mm, counter-clockwise unless a comment says otherwise. */
export type PlanPoint = readonly [xMm: number, yMm: number];
export type Plan = readonly PlanPoint[];

/** Whole circle as a regular polygon with its corners on the circle. */
export function circle(radiusMm: number, segments = 72, centre: PlanPoint = [0, 0]): Plan {
  return Array.from({ length: segments }, (_, index) => {
    const angle = (2 * Math.PI * index) / segments;
    return [centre[0] + radiusMm * Math.cos(angle), centre[1] + radiusMm * Math.sin(angle)] as const;
  });
}

/** Part of a circle from one angle to another (degrees, counter-clockwise), both ends included. */
export function arc(
  centre: PlanPoint,
  radiusMm: number,
  fromDegrees: number,
  toDegrees: number,
  segments: number,
): Plan {
  return Array.from({ length: segments + 1 }, (_, index) => {
    const angle = ((fromDegrees + ((toDegrees - fromDegrees) * index) / segments) * Math.PI) / 180;
    return [centre[0] + radiusMm * Math.cos(angle), centre[1] + radiusMm * Math.sin(angle)] as const;
  });
}

export function rectangle(fromX: number, fromY: number, toX: number, toY: number): Plan {
  return [
    [fromX, fromY],
    [toX, fromY],
    [toX, toY],
    [fromX, toY],
  ];
}

/** Rectangle about a centre with rounded corners; always the same number of corners, so that two can be lofted. */
export function roundedRectangle(
  widthMm: number,
  depthMm: number,
  radiusMm: number,
  centre: PlanPoint = [0, 0],
  cornerSegments = 8,
): Plan {
  const x = widthMm / 2 - radiusMm;
  const y = depthMm / 2 - radiusMm;
  const corners: [number, number, number][] = [
    [x, -y, -90],
    [x, y, 0],
    [-x, y, 90],
    [-x, -y, 180],
  ];
  return corners.flatMap(([cornerX, cornerY, start]) =>
    arc([centre[0] + cornerX, centre[1] + cornerY], radiusMm, start, start + 90, cornerSegments),
  );
}

/** Slot with round ends along x. */
export function stadium(fromX: number, toX: number, y: number, radiusMm: number, segments = 16): Plan {
  return [...arc([toX, y], radiusMm, -90, 90, segments), ...arc([fromX, y], radiusMm, 90, 270, segments)];
}

export const shifted = (plan: Plan, x: number, y: number): Plan => plan.map(([a, b]) => [a + x, b + y]);

/** Mirror image across the x axis, still counter-clockwise. */
export const mirroredAcrossX = (plan: Plan): Plan => plan.map(([x, y]) => [x, -y] as const).toReversed();

/** Signed area by the shoelace sum; positive for a counter-clockwise plan. */
export function areaMm2(plan: Plan): number {
  let twice = 0;
  for (let i = 0; i < plan.length; i++) {
    const [ax, ay] = at(plan, i);
    const [bx, by] = at(plan, i + 1);
    twice += ax * by - bx * ay;
  }
  return twice / 2;
}

/** Corner `index`, counted round the plan. */
export function at(plan: Plan, index: number): PlanPoint {
  const point = plan[((index % plan.length) + plan.length) % plan.length];
  if (!point) throw new RangeError('A plan needs at least one corner.');
  return point;
}

/** Every edge moved inwards by the same amount, corners mitred. Negative amounts move outwards. */
export function inset(plan: Plan, byMm: number): Plan {
  return plan.map((point, index) => {
    const before = inwardNormal(at(plan, index - 1), point);
    const after = inwardNormal(point, at(plan, index + 1));
    const along = 1 + before[0] * after[0] + before[1] * after[1];
    return [
      point[0] + ((before[0] + after[0]) * byMm) / along,
      point[1] + ((before[1] + after[1]) * byMm) / along,
    ] as const;
  });
}

function inwardNormal(from: PlanPoint, to: PlanPoint): PlanPoint {
  const x = to[0] - from[0];
  const y = to[1] - from[1];
  const length = Math.hypot(x, y);
  return [-y / length, x / length];
}
