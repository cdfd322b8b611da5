import { cellSolid } from './cell-solid.js';
import { loftedSolid } from './lofted-solid.js';
import { areaMm2, circle, rectangle } from './plan.js';
import { boundsOf, edgeFaults, laidAlongX, volumeMm3 } from './solid.js';

describe('loftedSolid', () => {
  it('makes a closed box with a hole through it and a blind one', () => {
    const plan = rectangle(0, 0, 20, 10);
    const through = circle(2, 24, [5, 5]);
    const blind = circle(1.5, 24, [15, 5]);
    const solid = loftedSolid(
      [
        { zMm: 0, plan },
        { zMm: 8, plan },
      ],
      [
        {
          sections: [
            { zMm: 0, plan: through },
            { zMm: 8, plan: through },
          ],
          opensBelow: true,
          opensAbove: true,
        },
        {
          sections: [
            { zMm: 3, plan: blind },
            { zMm: 8, plan: blind },
          ],
          opensBelow: false,
          opensAbove: true,
        },
      ],
    );
    expect(edgeFaults(solid)).toBe(0);
    expect(volumeMm3(solid)).toBeCloseTo(20 * 10 * 8 - areaMm2(through) * 8 - areaMm2(blind) * 5, 2);
  });

  it('makes a hollow that opens nowhere', () => {
    const solid = loftedSolid(
      [
        { zMm: 0, plan: rectangle(0, 0, 10, 10) },
        { zMm: 10, plan: rectangle(0, 0, 10, 10) },
      ],
      [
        {
          sections: [
            { zMm: 2, plan: rectangle(2, 2, 8, 8) },
            { zMm: 8, plan: rectangle(2, 2, 8, 8) },
          ],
          opensBelow: false,
          opensAbove: false,
        },
      ],
    );
    expect(edgeFaults(solid)).toBe(0);
    expect(volumeMm3(solid)).toBeCloseTo(1000 - 216, 9);
  });

  it('refuses sections that cannot be joined corner to corner', () => {
    const sections = [
      { zMm: 0, plan: circle(5, 12) },
      { zMm: 1, plan: circle(5, 16) },
    ];
    expect(() => loftedSolid(sections)).toThrow('Sections of 12 and 16 corners cannot be joined.');
  });
});

describe('cellSolid', () => {
  it('fills cells between their own heights and leaves no inner walls', () => {
    const solid = cellSolid([
      { plan: rectangle(0, 0, 4, 4), holes: [circle(1, 16, [2, 2])], filledMm: [[0, 3]] },
      {
        plan: rectangle(4, 0, 6, 4),
        filledMm: [
          [0, 3],
          [5, 6],
        ],
      },
      { plan: rectangle(6, 0, 7, 4), filledMm: [[0, 6]] },
    ]);
    const hole = areaMm2(circle(1, 16));
    expect(edgeFaults(solid)).toBe(0);
    expect(volumeMm3(solid)).toBeCloseTo((16 - hole) * 3 + 8 * 4 + 4 * 6, 3);
  });
});

describe('edgeFaults', () => {
  it('sees a missing triangle', () => {
    const plan = rectangle(0, 0, 1, 1);
    const box = loftedSolid([
      { zMm: 0, plan },
      { zMm: 1, plan },
    ]);
    expect(edgeFaults({ ...box, triangles: box.triangles.slice(1) })).toBe(3);
  });

  it('sees a triangle wound the wrong way', () => {
    const plan = rectangle(0, 0, 1, 1);
    const box = loftedSolid([
      { zMm: 0, plan },
      { zMm: 1, plan },
    ]);
    const [first, ...rest] = box.triangles;
    if (!first) throw new Error('no triangle');
    const turned = { ...box, triangles: [[first[0], first[2], first[1]] as const, ...rest] };
    expect(edgeFaults(turned)).toBeGreaterThan(0);
  });
});

describe('laidAlongX', () => {
  it('lays a solid on the bed without changing it', () => {
    const plan = rectangle(-1, -2, 1, 2);
    const laid = laidAlongX(
      loftedSolid([
        { zMm: 0, plan },
        { zMm: 9, plan },
      ]),
    );
    expect(boundsOf(laid).size).toEqual([9, 4, 2]);
    expect(boundsOf(laid).min[2]).toBe(0);
    expect(volumeMm3(laid)).toBeCloseTo(72, 9);
    expect(edgeFaults(laid)).toBe(0);
  });
});
