import { polygonArea } from './convex-hull.js';
import { packPlates, type PartToPack } from './index.js';
import type { Point } from './types.js';

/** How full the plates get, beside the least number of plates that the area alone would allow. */
const BED = { xMm: 220, yMm: 220, zMm: 250 };
const OPTIONS = { gapMm: 3, marginMm: 5 };

function circle(diameterMm: number): Point[] {
  return Array.from({ length: 64 }, (_, i) => {
    const angle = (2 * Math.PI * i) / 64;
    return [(diameterMm / 2) * Math.cos(angle), (diameterMm / 2) * Math.sin(angle)];
  });
}

function piece(code: string, quantity: number, shape: Partial<PartToPack>): PartToPack {
  return { code, quantity, heightMm: 40, orientation: 'may-turn', ...shape };
}

const kits: Record<string, PartToPack[]> = {
  'one rank of 37 round pipes': Array.from({ length: 37 }, (_, i) =>
    piece(`P-${String(i + 1).padStart(2, '0')}`, 1, {
      footprint: circle(60 * 2 ** (-i / 24)),
      heightMm: 200,
    }),
  ),
  '60 square pipes': [piece('P-01', 60, { sizeMm: [34, 28, 180] })],
  'keys, rails and blocks': [
    piece('K-01', 25, { sizeMm: [140, 18, 8] }),
    piece('R-01', 4, { sizeMm: [200, 25, 12] }),
    piece('B-01', 6, { sizeMm: [80, 60, 40] }),
    piece('S-01', 30, { footprint: circle(21) }),
  ],
  '40 three-cornered brackets': [
    piece('C-01', 40, {
      footprint: [
        [0, 0],
        [60, 0],
        [0, 45],
      ],
    }),
  ],
  '300 small felts': [piece('F-01', 300, { footprint: circle(12), orientation: 'as-exported' })],
};

const usableMm2 = (BED.xMm - 2 * OPTIONS.marginMm) * (BED.yMm - 2 * OPTIONS.marginMm);
console.log(`bed ${BED.xMm} × ${BED.yMm} mm, gap ${OPTIONS.gapMm} mm, margin ${OPTIONS.marginMm} mm`);
for (const [name, parts] of Object.entries(kits)) {
  const start = performance.now();
  const { plates } = packPlates(parts, BED, OPTIONS);
  const seconds = (performance.now() - start) / 1000;
  const areas = plates.map(({ placements }) =>
    placements.reduce((sum, { polygon }) => sum + polygonArea(polygon), 0),
  );
  const total = areas.reduce((sum, area) => sum + area, 0);
  const full = areas.slice(0, -1);
  const density =
    full.length > 0 ? full.reduce((sum, area) => sum + area, 0) / full.length / usableMm2 : total / usableMm2;
  console.log(
    `${name.padEnd(28)} ${plates.length} plates (by area alone at least ${Math.ceil(total / usableMm2)}), ` +
      `${(100 * density).toFixed(0)} % covered on full plates, ${seconds.toFixed(2)} s`,
  );
}
