import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { money, MoneyError, spread, sum } from './index.js';

type SpreadRow = { total: number; weights: number[]; parts: number[] };
const reference = JSON.parse(
  readFileSync(new URL('../fixtures/money-reference.json', import.meta.url), 'utf8'),
) as { spread: { rows: SpreadRow[] } };
const eur = (minor: number) => money(minor, 'EUR');
const minorsOf = (total: number, weights: number[]) => spread(eur(total), weights).map((part) => part.minor);
const someWeights = fc
  .array(fc.nat(1e12), { minLength: 1, maxLength: 20 })
  .filter((weights) => weights.some((weight) => weight > 0));

describe('spreading an amount over lines', () => {
  it.each(reference.spread.rows)('parts $total over $weights into $parts', ({ total, weights, parts }) => {
    expect(minorsOf(total, weights)).toEqual(parts);
  });

  it('always adds up to the amount', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e15, max: 1e15 }), someWeights, (total, weights) => {
        expect(sum(spread(eur(total), weights))).toEqual(eur(total));
      }),
    );
  });

  it('gives each line its exact share, less than a unit off', () => {
    fc.assert(
      fc.property(fc.nat(1e15), someWeights, (total, weights) => {
        const whole = weights.reduce((running, weight) => running + BigInt(weight), 0n);
        minorsOf(total, weights).forEach((part, line) => {
          const off = BigInt(part) * whole - BigInt(total) * BigInt(weights[line] ?? 0);
          expect(off > -whole && off < whole).toBe(true);
        });
      }),
    );
  });

  it('never gives more for less weight', () => {
    fc.assert(
      fc.property(fc.nat(1e9), someWeights, (total, weights) => {
        const parts = minorsOf(total, weights);
        const heaviestFirst = weights
          .map((weight, line) => ({ weight, line, part: parts[line] ?? 0 }))
          .toSorted((a, b) => b.weight - a.weight || a.line - b.line);
        const given = heaviestFirst.map(({ part }) => part);
        expect(given).toEqual(given.toSorted((a, b) => b - a));
      }),
    );
  });

  it('breaks ties towards the earlier line, below zero too', () => {
    expect(minorsOf(2, [5, 5, 5])).toEqual([1, 1, 0]);
    expect(minorsOf(-2, [5, 5, 5])).toEqual([-1, -1, 0]);
  });

  it('has nothing to do for nothing', () => {
    expect(minorsOf(0, [])).toEqual([]);
    expect(minorsOf(0, [0, 0])).toEqual([0, 0]);
  });

  it.each([[[]], [[0, 0]], [[1, -1]], [[0.5]], [[2 ** 53]]])('refuses to part 1 over %p', (weights) => {
    expect(() => spread(eur(1), weights)).toThrow(MoneyError);
  });
});
