import type { Part, RevisionFile } from '@windchest/contracts';
import { filesOfParts, meshesOf, meshesToTake, partIn, variantFileName } from './part-meshes.js';

const file = (id: string) => ({ id, fileName: `${id}.stl` }) as RevisionFile;
const part = (code: string, changes: Partial<Part> = {}) =>
  ({ id: code, code, name: `Part ${code}`, file: file(code), variants: [], ...changes }) as Part;

describe('the meshes of a part', () => {
  const tongue = part('J-01', {
    variants: [
      { clearance: 'plus', file: file('loose'), drawings: null },
      { clearance: 'minus', file: file('tight'), drawings: null },
    ],
  });

  it('stand in the order of their clearances', () => {
    expect(meshesOf(tongue).map((mesh) => [mesh.clearance, mesh.file.id])).toEqual([
      ['minus', 'tight'],
      ['zero', 'J-01'],
      ['plus', 'loose'],
    ]);
    expect(filesOfParts([tongue, part('P-01', { file: null })])).toHaveLength(3);
  });

  it('are that of the clearance asked for, or its own', () => {
    expect(partIn(tongue, 'plus')?.file?.id).toBe('loose');
    expect(partIn(tongue, 'zero')?.file?.id).toBe('J-01');
    expect(partIn(part('P-01'), 'plus')?.file?.id).toBe('P-01');
    expect(partIn(null, 'plus')).toBeUndefined();
  });

  it('can be taken from other parts that have one mesh', () => {
    const found = meshesToTake(part('P-01'), [
      part('P-01'),
      tongue,
      part('P-02'),
      part('P-03', { file: null }),
    ]);
    expect(found.map(({ code }) => code)).toEqual(['P-02']);
  });

  it('are sent under names that say which they are', () => {
    expect(variantFileName({ code: 'J-01', name: 'Locking tongue' }, 'plus', 'x y.STL')).toBe(
      'J-01 Locking tongue (plus).STL',
    );
    expect(variantFileName({ code: 'J-01', name: 'In/out: 1 (old)' }, 'minus', 'x.3mf')).toBe(
      'J-01 In out 1 old (minus).3mf',
    );
    expect(variantFileName({ code: 'J-01', name: 'J-01' }, 'minus', 'x.stl')).toBe('J-01 (minus).stl');
  });
});
