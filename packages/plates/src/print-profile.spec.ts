import { box, insideOut, joined, meshOf, torus } from '../fixtures/solids.js';
import { referenceMaterial as material } from '../fixtures/reference-prints.js';
import { estimateFromProfile, estimatePrint, PlatesError, profileOf, type PrintSpec } from './index.js';

const spec: PrintSpec = {
  nozzleMm: 0.4,
  layerMm: 0.2,
  perimeters: 2,
  topLayers: 4,
  bottomLayers: 4,
  infill: 0.15,
};
const block = box([30, 20, 12]);

describe('the print profile', () => {
  it('holds volume, sides and height of a box in closed form', () => {
    const profile = profileOf(block);
    expect(profile.volumeMm3).toBeCloseTo(30 * 20 * 12, 3);
    expect(profile.sideAreaMm2).toBeCloseTo(2 * (30 + 20) * 12, 3);
    expect(profile.heightMm).toBeCloseTo(12, 9);
    expect(profile.isClosed).toBe(true);
  });

  it('holds what remains of a box inside each inset in closed form', () => {
    const { insetMmSteps, insetVolumeMm3 } = profileOf(block);
    insetMmSteps.forEach((inset, i) => {
      const exact = (30 - 2 * inset) * (20 - 2 * inset) * 12;
      expect(Math.abs(insetVolumeMm3[i]! - exact)).toBeLessThan(0.005 * 30 * 20 * 12);
    });
  });

  it('holds the volume of a torus, 2π²·R·r² less the facets, within 1 %', () => {
    expect(
      Math.abs(profileOf(torus(20, 6, 72, 72)).volumeMm3 / (2 * Math.PI ** 2 * 20 * 36) - 1),
    ).toBeLessThan(0.01);
  });

  it('holds the room for infill of a box in closed form', () => {
    const profile = profileOf(block);
    const wall = profile.walls[profile.wallMmSteps.indexOf(0.83)]!;
    const shell = wall.shells[profile.shellMmSteps.findIndex((mm) => Math.abs(mm - 0.8) < 1e-9)]!;
    // Infill reaches a quarter of a line into walls of 0.83 mm; 0.8 mm at top and bottom are solid.
    const inset = 0.83 - 0.25 * 0.407;
    const exact = (30 - 2 * inset) * (20 - 2 * inset) * (12 - 1.6);
    expect(Math.abs(shell.sparseMm3 / exact - 1)).toBeLessThan(0.01);
    expect(shell.smallMm3).toBe(0);
    expect(Math.abs(shell.bridgedMm2 / ((30 - 2 * inset) * (20 - 2 * inset)) - 1)).toBeLessThan(0.03);
    expect(wall.ceilingMm2).toBe(0);
  });

  it('finds the ceiling of a hollow', () => {
    const hollow = joined(box([40, 40, 20]), insideOut(box([20, 20, 8], [10, 10, 6])));
    const { volumeMm3, walls } = profileOf(hollow);
    expect(volumeMm3).toBeCloseTo(40 * 40 * 20 - 20 * 20 * 8, 3);
    expect(Math.abs(walls[1]!.ceilingMm2 / 400 - 1)).toBeLessThan(0.05);
  });

  it('calls regions under 70 mm² small', () => {
    const { walls } = profileOf(box([8, 8, 12]));
    for (const { shells } of walls)
      for (const shell of shells) expect(shell.smallMm3).toBeCloseTo(shell.sparseMm3, 9);
  });

  it('is the same for a mesh turned inside out, moved far away, or in another order', () => {
    const profile = profileOf(block);
    expect(profileOf(insideOut(block))).toEqual(profile);
    const moved = profileOf(box([30, 20, 12], [5000, -3000, 700]));
    expect(moved.volumeMm3).toBeCloseTo(profile.volumeMm3, 2);
    const reversed = meshOf(
      Array.from({ length: block.triangles }, (_, i) => Array.from(block.corners.slice(9 * i, 9 * i + 9)))
        .reverse()
        .flat(),
    );
    expect(profileOf(reversed)).toEqual(profile);
  });

  it('counts shells that run into one another once', () => {
    const overlapping = joined(box([20, 20, 10]), box([20, 20, 10], [10, 0, 0]));
    const union = profileOf(box([30, 20, 10]));
    const profile = profileOf(overlapping);
    expect(Math.abs(profile.volumeMm3 / union.volumeMm3 - 1)).toBeLessThan(0.02);
    expect(Math.abs(profile.sideAreaMm2 / union.sideAreaMm2 - 1)).toBeLessThan(0.02);
    const [ours, theirs] = [profile, union].map((each) => estimateFromProfile(each, spec, material).massG);
    expect(Math.abs(ours! / theirs! - 1)).toBeLessThan(0.03);
  });

  it('says when a mesh is open, and the estimate then promises less', () => {
    const open = meshOf(block.corners.slice(0, 9 * 11));
    const profile = profileOf(open);
    expect(profile.isClosed).toBe(false);
    const doubt = estimateFromProfile(profile, spec, material).mayBeOffPercent;
    expect(doubt).toBeGreaterThan(estimatePrint(block, spec, material).mayBeOffPercent);
  });

  it('survives JSON, in few bytes', () => {
    const profile = profileOf(torus(20, 6, 48, 24));
    const text = JSON.stringify(profile);
    expect(text.length).toBeLessThan(6000);
    expect(JSON.parse(text)).toEqual(profile);
  });

  it('refuses a mesh without triangles and a layer of no thickness', () => {
    expect(() => profileOf(meshOf([]))).toThrow(PlatesError);
    expect(() => profileOf(block, 0)).toThrow(/layer thickness.*0/);
  });
});

describe('the estimate', () => {
  const profile = profileOf(box([40, 30, 25]));
  const massOf = (change: Partial<PrintSpec>): number =>
    estimateFromProfile(profile, { ...spec, ...change }, material).massG;

  it('is the same from the mesh and from its profile', () => {
    expect(estimatePrint(block, spec, material)).toEqual(
      estimateFromProfile(profileOf(block), spec, material),
    );
  });

  it('grows with infill, perimeters and solid layers, and stays below solid', () => {
    const rising = [
      [0, 0.05, 0.15, 0.4, 0.8, 1].map((infill) => massOf({ infill })),
      [0, 1, 2, 3, 4, 6].map((perimeters) => massOf({ perimeters })),
      [0, 1, 2, 4, 6, 10].map((count) => massOf({ topLayers: count, bottomLayers: count })),
    ];
    for (const masses of rising) {
      masses.slice(1).forEach((mass, i) => expect(mass).toBeGreaterThan(masses[i]!));
      for (const mass of masses) expect(mass).toBeLessThan(40 * 30 * 25 * 1e-3 * 1.24 * 1.02);
    }
  });

  it('takes longer in thinner layers', () => {
    const highest = [0.28, 0.2, 0.12].map(
      (layerMm) => estimateFromProfile(profile, { ...spec, layerMm }, material).minutes,
    );
    highest.slice(1).forEach((minutes, i) => expect(minutes.high).toBeGreaterThan(highest[i]!.high));
    for (const { low, high } of highest) expect(low).toBeLessThan(high);
  });

  it('refuses settings that make no sense, and says what to give', () => {
    expect(() => massOf({ infill: 15 })).toThrow(
      'The infill is 15; give a share from 0 to 1 (15 % is 0.15).',
    );
    expect(() => massOf({ layerMm: 0.5 })).toThrow(/higher than the nozzle/);
    expect(() => massOf({ perimeters: 1.5 })).toThrow(/perimeters is 1.5/);
    expect(() => massOf({ nozzleMm: 0 })).toThrow(/nozzle/);
  });
});
