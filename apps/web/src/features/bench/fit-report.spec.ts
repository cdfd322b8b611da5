import type { KitPart } from '@windchest/contracts';
import { fitReport } from './fit-report.js';

const part = (code: string, x: number, y: number, z: number, rest: Partial<KitPart> = {}): KitPart => ({
  code,
  name: `Part ${code}`,
  quantity: 1,
  orientation: 'as-exported',
  sizeMm: { x, y, z },
  volumeMm3: 1,
  areaMm2: 1,
  printSpec: null,
  drawing: null,
  previewBytes: null,
  previewSha256: null,
  ...rest,
});
const bed = { xMm: 220, yMm: 180, zMm: 200 };

describe('a kit against a printer', () => {
  it('tells what fits, what fits turned, and by how much the rest is too big', () => {
    const { fits } = fitReport(
      [
        part('A-01', 100, 100, 100),
        part('A-02', 100, 210, 10, { orientation: 'may-turn' }),
        part('A-03', 100, 100, 212.5),
        part('A-04', 100, 190, 10),
      ],
      bed,
    );
    expect(fits.map(({ code, fit }) => [code, fit.fit])).toEqual([
      ['A-01', 'fits'],
      ['A-02', 'fits-turned'],
      ['A-03', 'too-big'],
      ['A-04', 'too-big'],
    ]);
    expect(fits[2]?.fit.overMm).toEqual({ axis: 'z', mm: 12.5 });
    expect(fits[3]?.fit.overMm?.axis).toBe('y');
    expect(fits[3]?.fit.overMm?.mm).toBeCloseTo(10, 9);
  });

  it('does not judge a part without a size', () => {
    const report = fitReport([part('A-01', 0, 0, 0), part('A-02', 1, 1, 1)], bed);
    expect(report.unmeasured).toEqual(['A-01']);
    expect(report.fits).toHaveLength(1);
  });
});
