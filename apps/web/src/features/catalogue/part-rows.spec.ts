import type { Comparison, Part } from '@windchest/contracts';
import { countedDifferences, isDifferent, partRows } from './part-rows.js';

const part = (code: string): Part => ({
  id: code,
  code,
  name: `Part ${code}`,
  quantity: 1,
  orientation: 'as-exported',
  printSpec: null,
  voice: null,
  isGauge: false,
  file: null,
  drawings: null,
  previewBytes: null,
  previewSha256: null,
  variants: [],
});
const row = (code: string, difference: Comparison['rows'][number]['difference']) => ({
  code,
  name: `Part ${code}`,
  quantity: 1,
  difference,
  whatDiffers: '',
  sizeChangeMm: null,
  volumeChangePercent: null,
  areaChangePercent: null,
  deviation: null,
  mark: null,
  reason: '',
  variants: [],
});
const withEarlier = { id: 'x', label: 'Mk 1.0' };

describe('partRows', () => {
  it('puts changed parts first and codes in the order people count', () => {
    const rows = partRows([part('P-10'), part('P-9'), part('J-01')], {
      with: withEarlier,
      rows: [row('P-10', 'same'), row('P-9', 'same'), row('J-01', 'changed')],
    });
    expect(rows.map((one) => one.code)).toEqual(['J-01', 'P-9', 'P-10']);
  });

  it('lists a part the earlier revision had as dropped', () => {
    const rows = partRows([part('P-1')], {
      with: withEarlier,
      rows: [row('P-1', 'same'), row('B-4', 'dropped')],
    });
    expect(rows.map((one) => [one.code, one.part === null])).toEqual([
      ['B-4', true],
      ['P-1', false],
    ]);
  });

  it('leaves out what is the same where only changes are asked for', () => {
    const rows = partRows([part('P-1'), part('P-2'), part('P-3'), part('P-4')], {
      with: withEarlier,
      rows: [
        row('P-1', 'same'),
        row('P-2', 'changed'),
        row('P-3', 're-exported'),
        row('P-4', 'new'),
        row('B-4', 'dropped'),
      ],
    });
    expect(rows.filter(isDifferent).map((one) => one.code)).toEqual(['P-2', 'P-4', 'B-4']);
  });

  it('compares with nothing where there is no earlier revision', () => {
    const [only] = partRows([part('P-1')], { with: null, rows: [row('P-1', 'new')] });
    expect(only?.comparison).toBeNull();
  });
});

describe('countedDifferences', () => {
  it('tells only the kinds that occur', () => {
    expect(countedDifferences([row('A-1', 'same'), row('A-2', 'changed'), row('A-3', 'same')])).toEqual([
      { difference: 'changed', count: 1 },
      { difference: 'same', count: 2 },
    ]);
  });
});
