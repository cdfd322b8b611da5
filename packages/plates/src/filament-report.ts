import {
  compareAll,
  meanSize,
  reference,
  referenceMaterial,
  referenceProfile,
  specOf,
} from '../fixtures/reference-prints.js';
import { estimateFromProfile } from './estimate-print.js';

/** Our filament and time beside a slicer's, run by run: `npx tsx packages/plates/src/filament-report.ts`. */
const comparisons = compareAll();
const columns = (cells: readonly string[]): string =>
  cells.map((cell, i) => (i === 0 ? cell.padEnd(26) : cell.padStart(11))).join('');
const signed = (percent: number): string => `${percent < 0 ? '−' : '+'}${Math.abs(percent).toFixed(1)} %`;

console.log(
  columns([
    'part',
    'infill',
    'layer',
    'perimeters',
    'pattern',
    'slicer mm',
    'ours mm',
    'error',
    'slicer min',
    'ours min',
  ]),
);
for (const { run, estimate, errorPercent } of comparisons) {
  const { low, high } = estimate.minutes;
  console.log(
    columns([
      run.part,
      `${run.infill_pct} %`,
      `${run.layer_mm} mm`,
      String(run.perimeters),
      run.pattern === 'rectilinear' ? 'solid' : run.pattern,
      run.filament_mm.toFixed(0),
      (1000 * estimate.lengthM).toFixed(0),
      signed(errorPercent),
      (run.time_s / 60).toFixed(0),
      `${low.toFixed(0)}–${high.toFixed(0)}`,
    ]),
  );
}

const sizes = comparisons.map(({ errorPercent }) => Math.abs(errorPercent)).sort((a, b) => a - b);
const worst = comparisons.reduce((a, b) => (Math.abs(b.errorPercent) > Math.abs(a.errorPercent) ? b : a));
const median = (sizes[Math.floor((sizes.length - 1) / 2)]! + sizes[Math.ceil((sizes.length - 1) / 2)]!) / 2;
const parts = [...new Set(comparisons.map(({ run }) => run.part))];
const byPart = parts.map((part) =>
  meanSize(comparisons.filter(({ run }) => run.part === part).map((c) => c.errorPercent)),
);
const kit = comparisons.filter(
  ({ run }) =>
    run.infill_pct === 15 && run.layer_mm === 0.2 && run.perimeters === 2 && run.pattern === 'gyroid',
);
const ours = kit.reduce((sum, { estimate }) => sum + 1000 * estimate.lengthM, 0);
const theirs = kit.reduce((sum, { run }) => sum + run.filament_mm, 0);
console.log(
  `\nworst ${signed(worst.errorPercent)} (${worst.run.part}, ${worst.run.pattern}), median ${median.toFixed(2)} %, mean ${meanSize(sizes).toFixed(2)} % of ${sizes.length} runs`,
);
console.log(`mean over ${parts.length} parts, each counted once: ${meanSize(byPart).toFixed(2)} %`);
console.log(`all ${kit.length} parts at 15 % and 0.2 mm as one kit: ${signed(100 * (ours / theirs - 1))}`);

console.log(`\nbeside a second slicer (${reference.second_slicer.tool})`);
for (const { part, slic3r_1_3_0_mm: length } of reference.second_slicer.rows) {
  const spec = specOf({ layer_mm: 0.2, perimeters: 2, infill_pct: 15 });
  const { lengthM } = estimateFromProfile(referenceProfile(part), spec, referenceMaterial);
  console.log(
    columns([
      part,
      '15 %',
      '0.2 mm',
      '2',
      '',
      length.toFixed(0),
      (1000 * lengthM).toFixed(0),
      signed(100 * ((1000 * lengthM) / length - 1)),
    ]),
  );
}
