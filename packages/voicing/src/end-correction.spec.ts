import fc from 'fast-check';
import { endCorrectionMm, FLANGED_END_RADII } from './end-correction.js';

const bores = fc.double({ min: 1, max: 100, noNaN: true });
const walls = fc.double({ min: 0, max: 1000, noNaN: true });

describe('the end correction', () => {
  it('lies between a thin end and an end in an endless wall, and grows with the wall', () => {
    fc.assert(
      fc.property(bores, walls, (boreMm, wallMm) => {
        const correctionMm = endCorrectionMm({ boreMm, wallMm });
        expect(correctionMm).toBeGreaterThanOrEqual(endCorrectionMm({ boreMm, wallMm: 0 }) - 1e-9);
        expect(correctionMm).toBeLessThan(endCorrectionMm({ boreMm, wallMm: 0, flanged: true }));
        expect(endCorrectionMm({ boreMm, wallMm: wallMm + 1 })).toBeGreaterThan(correctionMm);
      }),
    );
  });

  it('meets the endless wall within a thousandth of the radius (Nomura 1960; the fit ends at 0.821)', () => {
    expect(endCorrectionMm({ boreMm: 2, wallMm: 1e6 })).toBeCloseTo(FLANGED_END_RADII, 2);
  });

  it('refuses a bore of nothing and a wall of less', () => {
    expect(() => endCorrectionMm({ boreMm: 0, wallMm: 1 })).toThrow(/boreMm must be a number above zero/);
    expect(() => endCorrectionMm({ boreMm: 10, wallMm: -1 })).toThrow(/wallMm must be zero or more/);
  });
});
