import { footprintOf, profileOf } from '@windchest/plates';
import { readMesh, writeBinaryStl } from '@windchest/meshes';
import { estimateKit } from './estimate-kit.js';
import type { PrintPlan } from '../catalogue/print/print-plans.js';

/** A box of these sides, in mm. */
const box = (x: number, y: number, z: number): number[] => {
  const corner = (i: number): [number, number, number] => [i & 1 ? x : 0, i & 2 ? y : 0, i & 4 ? z : 0];
  const faces = [
    [0, 2, 3, 1],
    [4, 5, 7, 6],
    [0, 1, 5, 4],
    [2, 6, 7, 3],
    [0, 4, 6, 2],
    [1, 3, 7, 5],
  ] as const;
  return faces.flatMap(([a, b, c, d]) => [a, b, c, a, c, d].flatMap(corner));
};
const plan = (quantity: number, material = 'PLA'): PrintPlan => {
  const mesh = readMesh(writeBinaryStl(Float32Array.from(box(20, 20, 20))), { fileName: 'cube.stl' });
  const spec = {
    nozzleMm: 0.4,
    layerMm: 0.2,
    perimeters: 2,
    topLayers: 4,
    bottomLayers: 4,
    infill: 0.15,
    material,
    supports: 'none' as const,
    remarks: '',
  };
  return {
    bed: { xMm: 100, yMm: 100, zMm: 100 },
    parts: [
      {
        code: 'C-01',
        quantity,
        orientation: 'may-turn',
        spec,
        heightMm: 20,
        footprint: footprintOf(mesh),
        profile: profileOf(mesh),
      },
    ],
  };
};

describe('the print estimate of a kit', () => {
  it('is a slicer’s figure for a 20 mm cube within 4 % (reference run: PrusaSlicer 2.5.0, 3.57 g, 20 min 32 s)', () => {
    const estimate = estimateKit(plan(1));
    expect(Math.abs((estimate?.massG ?? 0) / 3.5665 - 1)).toBeLessThan(0.04);
    expect(estimate?.hoursLow).toBeLessThan(1232 / 3600);
    expect(estimate?.hoursHigh).toBeGreaterThan(1232 / 3600);
  });

  it('counts pieces and plates: a bed of 100 mm takes nine cubes of 20 mm with 5 mm about them', () => {
    const one = estimateKit(plan(1));
    const many = estimateKit(plan(18));
    expect(many?.massG).toBeCloseTo(18 * (one?.massG ?? 0), 6);
    expect([one?.plates, many?.plates]).toEqual([1, 2]);
  });

  it('is not given for a material whose density nobody knows', () => {
    expect(estimateKit(plan(1, 'moon dust'))).toBeNull();
  });
});
