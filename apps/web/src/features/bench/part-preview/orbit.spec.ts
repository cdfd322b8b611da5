import { approached, dragged, eyeOf, firstOrbit, stepOfKey, steps, turned } from './orbit.js';

describe('looking at a part from all sides', () => {
  it('goes all the way around and comes back', () => {
    let orbit = firstOrbit;
    for (let times = 0; times < 24; times++) orbit = steps.left(orbit);
    expect(orbit.aroundDeg).toBeCloseTo(firstOrbit.aroundDeg, 9);
    expect(turned(firstOrbit, -40, 0).aroundDeg).toBeCloseTo(352, 9);
  });

  it('stops short of straight above and below', () => {
    expect(turned(firstOrbit, 0, 500).aboveDeg).toBe(89);
    expect(turned(firstOrbit, 0, -500).aboveDeg).toBe(-89);
  });

  it('comes neither into the part nor so far that it is lost', () => {
    expect(approached(firstOrbit, 0.001).distance).toBe(0.3);
    expect(approached(firstOrbit, 1000).distance).toBe(2);
  });

  it('turns the part the way it is pushed, by drag, key and button alike', () => {
    const behind = { ...firstOrbit, aroundDeg: 180 };
    expect(dragged(behind, { x: 100, y: 0 }, 400).aroundDeg).toBeCloseTo(135, 9);
    expect(steps[stepOfKey('ArrowRight')!](behind).aroundDeg).toBeCloseTo(165, 9);
    const down = steps[stepOfKey('ArrowDown')!](firstOrbit);
    expect(Math.sign(dragged(firstOrbit, { x: 0, y: 9 }, 400).aboveDeg - firstOrbit.aboveDeg)).toBe(
      Math.sign(down.aboveDeg - firstOrbit.aboveDeg),
    );
    expect(stepOfKey('Tab')).toBeUndefined();
  });

  it('puts the eye so far off that a ball around the part fills the view', () => {
    const eye = eyeOf({ aroundDeg: 0, aboveDeg: 0, distance: 1 }, 10, 60);
    expect(eye[0]).toBeCloseTo(0, 9);
    // sin 30° is one half, so the tangents of the view touch a ball of 10 at 20.
    expect(eye[2]).toBeCloseTo(20, 9);
    const above = eyeOf({ aroundDeg: 90, aboveDeg: 30, distance: 1 }, 10, 60);
    expect(above[1]).toBeCloseTo(10, 9);
    expect(Math.hypot(...above)).toBeCloseTo(20, 9);
  });
});
