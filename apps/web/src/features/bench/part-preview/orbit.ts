/** Where one looks at a part from: around it, above it, and how near. Angles in degrees. */
export interface Orbit {
  /** Around the upright axis; 0 looks at the front, growing to the right. */
  aroundDeg: number;
  /** Above the bed. */
  aboveDeg: number;
  /** Of the distance from which the whole part is seen; smaller is nearer. */
  distance: number;
}

export const firstOrbit: Orbit = { aroundDeg: 32, aboveDeg: 24, distance: 1 };

/** Straight from above and below, left and right would be one. */
const steepestDeg = 89;
const nearest = 0.3;
const farthest = 2;
const turnStepDeg = 15;
const nearerStep = 0.8;

const between = (least: number, value: number, most: number) => Math.min(most, Math.max(least, value));

export const turned = (orbit: Orbit, aroundDeg: number, aboveDeg: number): Orbit => ({
  ...orbit,
  aroundDeg: (((orbit.aroundDeg + aroundDeg) % 360) + 360) % 360,
  aboveDeg: between(-steepestDeg, orbit.aboveDeg + aboveDeg, steepestDeg),
});

export const approached = (orbit: Orbit, factor: number): Orbit => ({
  ...orbit,
  distance: between(nearest, orbit.distance * factor, farthest),
});

/** What the buttons and the keys do. The part turns the way the arrow points, as if pushed by a finger. */
export const steps = {
  left: (orbit: Orbit) => turned(orbit, turnStepDeg, 0),
  right: (orbit: Orbit) => turned(orbit, -turnStepDeg, 0),
  up: (orbit: Orbit) => turned(orbit, 0, -turnStepDeg),
  down: (orbit: Orbit) => turned(orbit, 0, turnStepDeg),
  nearer: (orbit: Orbit) => approached(orbit, nearerStep),
  farther: (orbit: Orbit) => approached(orbit, 1 / nearerStep),
  reset: () => firstOrbit,
} as const satisfies Record<string, (orbit: Orbit) => Orbit>;
export type OrbitStep = keyof typeof steps;

const keys: Readonly<Record<string, OrbitStep>> = {
  ArrowLeft: 'left',
  ArrowRight: 'right',
  ArrowUp: 'up',
  ArrowDown: 'down',
  '+': 'nearer',
  '=': 'nearer',
  '-': 'farther',
  Home: 'reset',
};
export const stepOfKey = (key: string): OrbitStep | undefined => keys[key];

/** A drag across the whole view turns the part half around. */
export const dragged = (orbit: Orbit, byPx: { x: number; y: number }, viewPx: number): Orbit =>
  turned(orbit, (-byPx.x / Math.max(1, viewPx)) * 180, (byPx.y / Math.max(1, viewPx)) * 180);

/** Where the eye is, as x, y (up), z around a part whose farthest point is `radius` from its middle. */
export function eyeOf(
  { aroundDeg, aboveDeg, distance }: Orbit,
  radius: number,
  fovDeg: number,
): [number, number, number] {
  const rad = Math.PI / 180;
  const far = (radius / Math.sin((fovDeg / 2) * rad)) * distance;
  const flat = Math.cos(aboveDeg * rad) * far;
  return [Math.sin(aroundDeg * rad) * flat, Math.sin(aboveDeg * rad) * far, Math.cos(aroundDeg * rad) * flat];
}
