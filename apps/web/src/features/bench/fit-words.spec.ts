import type { NamedPart } from './fit-words.js';
import { fitWords, liesWords } from './fit-words.js';

const part = (code: string, fit: NamedPart['fit'], rest: Partial<NamedPart> = {}): NamedPart => ({
  code,
  name: 'Lid',
  fit,
  isStood: false,
  isKeptOffByMargin: false,
  estimate: null,
  ...rest,
});
const fits = part('A-01', { fit: 'fits' });
const asked = (parts: NamedPart[], unmeasured: string[] = []) =>
  fitWords({ parts, unmeasured, volume: '220 × 220 × 250', marginMm: 5 });

describe('parts against a printer, in words', () => {
  it('say once that all fits', () => {
    expect(asked([fits, fits])).toEqual([{ state: 'ok', words: 'All 2 parts fit 220 × 220 × 250 mm.' }]);
    expect(asked([fits])[0]?.words).toBe('The part fits 220 × 220 × 250 mm.');
    expect(asked([])).toEqual([]);
  });

  it('name each part that does not fit, by how much, and in which direction', () => {
    const lines = asked([
      fits,
      part('G-02', { fit: 'too-big', overMm: { axis: 'x', mm: 12.46 } }),
      part('G-03', { fit: 'too-big', overMm: { axis: 'z', mm: 0.01 } }),
      part('G-04', { fit: 'too-big', overMm: { axis: 'z', mm: 30 } }),
    ]);
    expect(lines).toEqual([
      { state: 'stop', words: '1 of 4 parts fit 220 × 220 × 250 mm.' },
      { state: 'stop', words: 'Too wide: G-02 (Lid) by 12.5 mm.' },
      { state: 'stop', words: 'Too tall: G-03 (Lid) by 0.1 mm, G-04 (Lid) by 30 mm.' },
    ]);
  });

  it('say what has to be turned, laid or stood, what the margin keeps off, and what nobody measured', () => {
    const lines = asked(
      [
        part('J-01', { fit: 'fits-turned', turnedDegrees: -37.6 }),
        part('J-02', { fit: 'fits-laid', laidAxis: 'x' }),
        part('J-03', { fit: 'fits-laid', laidAxis: 'y' }, { isStood: true }),
        part('J-04', { fit: 'fits' }, { isKeptOffByMargin: true }),
      ],
      ['K-01'],
    );
    expect(lines.map(({ state, words }) => [state, words])).toEqual([
      ['ok', 'All 4 parts fit 220 × 220 × 250 mm.'],
      ['warn', expect.stringMatching(/margin of 5 mm leaves too little room: J-04\./)],
      ['note', 'Turned on the bed: J-01 by 38°.'],
      ['note', 'Laid on a side, as the maker allows: J-02.'],
      ['note', 'Stood on a side, as the maker allows: J-03.'],
      ['note', 'Without a size yet: K-01.'],
    ]);
  });

  it('tell of one part in a few words how it lies', () => {
    const words = (one: NamedPart) => [liesWords(one).state, liesWords(one).words];
    expect(words(fits)).toEqual(['ok', 'fits as drawn']);
    expect(words(part('B', { fit: 'fits-turned', turnedDegrees: 90 }))).toEqual(['ok', 'fits turned by 90°']);
    expect(words(part('B', { fit: 'fits-laid', laidAxis: 'y' }))).toEqual(['ok', 'fits laid on a side']);
    expect(words(part('B', { fit: 'too-big', overMm: { axis: 'y', mm: 3 } }))).toEqual([
      'stop',
      '3 mm too deep',
    ]);
    expect(words(part('B', { fit: 'fits' }, { isKeptOffByMargin: true }))[0]).toBe('warn');
  });
});
