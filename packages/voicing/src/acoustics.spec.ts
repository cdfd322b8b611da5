import { readFileSync } from 'node:fs';
import { referenceChecks } from '../fixtures/acoustics-checks.fixture.js';

/** The reference rows as they were handed over: value, tolerance and source of each, none of them ours. */
type Row = {
  id: string;
  quantity: string;
  inputs: Record<string, number>;
  expected: unknown;
  tolerance: unknown;
  source: string;
};

const { rows } = JSON.parse(
  readFileSync(new URL('../fixtures/acoustics.fixture.json', import.meta.url), 'utf8'),
) as { rows: Row[] };

const shown = (value: unknown): string =>
  JSON.stringify(value, (_key, part: unknown) =>
    typeof part === 'number' ? Number(part.toPrecision(9)) : part,
  );

/** Numbers of one tolerance, whatever they are wrapped in; a tolerance in words leaves the row's own check to judge. */
function expectNear(got: unknown, expected: unknown, tolerance: unknown): void {
  if (typeof expected === 'number' && typeof got === 'number') {
    const allowed = typeof tolerance === 'number' ? tolerance : Number.NaN;
    expect(Math.abs(got - expected)).toBeLessThanOrEqual(allowed);
    return;
  }
  if (typeof expected === 'object' && expected !== null && typeof got === 'object' && got !== null) {
    expect(Object.keys(got)).toEqual(Object.keys(expected));
    for (const [key, value] of Object.entries(expected)) {
      const own =
        typeof tolerance === 'object' && tolerance !== null
          ? (tolerance as Record<string, unknown>)[key]
          : tolerance;
      expectNear((got as Record<string, unknown>)[key], value, own);
    }
    return;
  }
  throw new Error(`Nothing to compare: got ${shown(got)}, expected ${shown(expected)}.`);
}

describe('the voicing calculation agrees with values from outside', () => {
  it('has 99 rows and a check for each of them', () => {
    expect(rows).toHaveLength(99);
    expect(rows.map(({ id }) => id).filter((id) => referenceChecks[id] === undefined)).toEqual([]);
    expect(Object.keys(referenceChecks)).toHaveLength(99);
  });

  const table = rows.map((row) => ({ ...row, check: referenceChecks[row.id] }));
  for (const { id, quantity, inputs, source, expected, tolerance, check } of table) {
    if (check === undefined) continue;
    const got = check.got(inputs);
    const wide = check.tolerance ?? tolerance;
    it(`${id}: ${quantity}: expected ${shown(expected)} ± ${shown(tolerance)}, got ${shown(got)} [${source}]`, () => {
      expectNear(got, expected, wide);
      check.also?.();
    });
  }
});
