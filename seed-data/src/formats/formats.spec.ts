import { measure, readMesh } from '@windchest/meshes';
import { loftedSolid } from '../geometry/lofted-solid.js';
import { rectangle } from '../geometry/plan.js';
import { binaryStl } from './binary-stl.js';
import { threeMf } from './three-mf.js';

const plan = rectangle(0, 0, 30, 20);
const box = loftedSolid([
  { zMm: 0, plan },
  { zMm: 10, plan },
]);

describe('binaryStl', () => {
  it('has 84 bytes and 50 more for each triangle, and does not begin like a text file', () => {
    const bytes = binaryStl(box, 'solid box');
    expect(bytes).toHaveLength(84 + 50 * box.triangles.length);
    expect(new TextDecoder().decode(bytes.subarray(0, 8))).toBe('part box');
    expect(new DataView(bytes.buffer).getUint32(80, true)).toBe(12);
  });

  it('is read back as the same solid', () => {
    const measured = measure(readMesh(binaryStl(box, 'box'), { fileName: 'box.stl' }));
    expect(measured).toMatchObject({ watertight: true, shells: 1, triangles: 12, windingFaults: 0 });
    expect(measured.volumeMm3).toBeCloseTo(6000, 6);
  });
});

describe('threeMf', () => {
  it('is read back as the same solid, in millimetres, under a title that needs escaping', () => {
    const mesh = readMesh(threeMf(box, 'Box <"A" & B>'), { fileName: 'box.3mf' });
    expect(mesh.statedUnit).toBe('millimeter');
    expect(measure(mesh)).toMatchObject({ format: '3mf', watertight: true, triangles: 12 });
  });

  it('gives the same bytes every time', () => {
    expect(threeMf(box, 'box')).toEqual(threeMf(box, 'box'));
  });
});
