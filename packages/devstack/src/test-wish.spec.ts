import { readTestWish } from './test-wish.mjs';

const suitesOf = (...words: string[]) => [...readTestWish(words).suites];

describe('reading what to test', () => {
  it('runs everything when nothing is asked for', () => {
    expect(suitesOf()).toEqual(['lint', 'unit', 'db', 'e2e']);
  });

  it('runs the parts named', () => {
    expect(suitesOf('db', 'e2e')).toEqual(['db', 'e2e']);
  });

  it('takes other words as parts of file paths, for all that has files', () => {
    expect(readTestWish(['unit', '--', 'orders'])).toEqual({
      suites: new Set(['unit']),
      patterns: ['orders'],
    });
    expect(suitesOf('orders')).toEqual(['unit', 'db', 'e2e']);
  });

  it('refuses an option it does not know', () => {
    expect(() => readTestWish(['--watch'])).toThrow(/"--watch" is not known/);
  });
});
