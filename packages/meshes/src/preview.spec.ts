import { readFileSync } from 'node:fs';
import { boxCorners, meshOf, tubeCorners } from '../fixtures/solids.js';
import { measure, preview, readMesh } from './index.js';

interface Gltf {
  readonly nodes: readonly [unknown, { translation: number[]; scale: number[] }];
  readonly accessors: readonly { count: number; min?: number[]; max?: number[] }[];
  readonly bufferViews: readonly { byteOffset: number; byteLength: number }[];
  readonly buffers: readonly { byteLength: number }[];
}

/** Takes a preview apart again, into corners in mm. */
function unpack(glb: Uint8Array): { gltf: Gltf; corners: number[] } {
  const view = new DataView(glb.buffer, glb.byteOffset, glb.byteLength);
  expect([view.getUint32(0, true), view.getUint32(4, true), view.getUint32(8, true)]).toEqual([
    0x46546c67,
    2,
    glb.length,
  ]);
  const jsonLength = view.getUint32(12, true);
  const gltf = JSON.parse(String.fromCharCode(...glb.subarray(20, 20 + jsonLength))) as Gltf;
  const start = 28 + jsonLength;
  expect(view.getUint32(20 + jsonLength, true)).toBe(glb.length - start);
  expect(gltf.buffers[0]!.byteLength).toBe(glb.length - start);
  const { translation, scale } = gltf.nodes[1];
  const corners: number[] = [];
  let highest = 0;
  for (let i = 0; i < gltf.accessors[1]!.count; i += 1) {
    const point = view.getUint16(start + gltf.bufferViews[1]!.byteOffset + 2 * i, true);
    highest = Math.max(highest, point);
    for (let axis = 0; axis < 3; axis += 1)
      corners.push(translation[axis]! + scale[axis]! * glb[start + 4 * point + axis]!);
  }
  expect(highest).toBeLessThan(gltf.accessors[0]!.count);
  return { gltf, corners };
}

function read(file: string) {
  return readMesh(new Uint8Array(readFileSync(new URL(`../fixtures/reference/${file}`, import.meta.url))), {
    fileName: file,
  });
}

describe('the preview of a part', () => {
  it.each([
    'egg_vessel_25.stl',
    'sphere_r15_fn96.stl',
    '3mfc_core_cube_gears.3mf',
    'plate_lattice_9x5.stl',
    'slab_120x80x2.stl',
    'bar_arched_180.3mf',
  ])('of %s is at most 60 KB, sits where the part sits and has about its size', (file) => {
    const mesh = read(file);
    const before = measure(mesh);
    const glb = preview(mesh);
    expect(glb.length).toBeLessThanOrEqual(60_000);
    const after = measure(meshOf(unpack(glb).corners));
    const longest = Math.max(...before.sizeMm);
    before.minMm.forEach((low, axis) =>
      expect(Math.abs(after.minMm[axis]! - low)).toBeLessThanOrEqual(0.05 * longest),
    );
    before.maxMm.forEach((high, axis) =>
      expect(Math.abs(after.maxMm[axis]! - high)).toBeLessThanOrEqual(0.05 * longest),
    );
  });

  it('keeps no dimension finer than half a millimetre', () => {
    for (const file of ['stopper_d20p8.stl', 'reed_plate_44.stl', 'sphere_r15_fn32.stl']) {
      const { gltf } = unpack(preview(read(file)));
      for (const step of gltf.nodes[1].scale) expect(step).toBeGreaterThan(0.5);
    }
  });

  it('does not give a bore at its true size away', () => {
    const radius = (corners: ArrayLike<number>): number => {
      let least = Infinity;
      for (let i = 0; i < corners.length; i += 3)
        least = Math.min(least, Math.hypot(corners[i]!, corners[i + 1]!));
      return least;
    };
    const errors = [8.03, 8.17, 8.31, 8.44].map((bore) => {
      const { corners } = unpack(preview(meshOf(tubeCorners(12, bore, 60, 64))));
      return Math.abs(radius(corners) - bore);
    });
    expect(Math.max(...errors)).toBeGreaterThan(0.1);
  });

  it('is the same for the same part', () => {
    const box = meshOf(boxCorners([40, 30, 10]));
    expect(preview(box)).toEqual(preview(box));
  });
});
