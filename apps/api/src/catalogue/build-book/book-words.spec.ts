import type { PrintSpecification, RankVoice } from '@windchest/contracts';
import { bookVoices } from './book-voices.js';
import { filamentHex, hexToOklch, kitShades, oklchToHex } from './kit-shades.js';
import { dayText, fixedText, numberText, signedText } from '../../typesetting/number-text.js';
import { specDifference, specDifferences } from './print-spec-words.js';

const spec: PrintSpecification = {
  nozzleMm: 0.4,
  layerMm: 0.2,
  perimeters: 2,
  topLayers: 4,
  bottomLayers: 4,
  infill: 0.15,
  material: 'PLA',
  supports: 'none',
  remarks: '',
};
const part = (code: string, printSpec: PrintSpecification | null) => ({
  code,
  name: code,
  quantity: 1,
  isGauge: false,
  clearances: [],
  orientation: 'may-lie' as const,
  sizeMm: null,
  volumeCm3: null,
  drawing: null,
  printSpec,
});

describe('specDifference', () => {
  it('names only what differs', () => {
    const own = { ...spec, layerMm: 0.12, supports: 'everywhere' as const, remarks: 'Slowly.' };
    expect(specDifference(own, spec)).toBe('Layer height 0.12 mm, supports everywhere. Slowly.');
    expect(specDifference({ ...spec }, spec)).toBe('');
    expect(specDifference(null, spec)).toBe('');
  });

  it('letters each set of settings once, in the order of the parts', () => {
    const solid = { ...spec, infill: 1 };
    const { sets, letterOf } = specDifferences(
      [part('A-1', null), part('A-2', solid), part('A-3', { ...spec, perimeters: 4 }), part('A-4', solid)],
      spec,
    );
    expect(sets).toEqual([
      { letter: 'a', words: 'Infill 100 %.', codes: ['A-2', 'A-4'] },
      { letter: 'b', words: 'Perimeters 4.', codes: ['A-3'] },
    ]);
    expect(letterOf.get('A-4')).toBe('a');
    expect(letterOf.has('A-1')).toBe(false);
  });
});

describe('numbers in print', () => {
  it('have a true minus, and none before nothing', () => {
    expect(numberText(-1.25, 1)).toBe('−1.3');
    expect(fixedText(-0.01, 1)).toBe('0.0');
    expect(signedText(0.34, 1)).toBe('+0.3');
    expect(signedText(0.01, 1)).toBe('0.0');
    expect(signedText(-12, 1)).toBe('−12.0');
  });

  it('have days of the calendar of Greenwich', () => {
    expect(dayText(new Date('2026-09-30T23:59:59Z'))).toBe('30 September 2026');
  });
});

describe('bookVoices', () => {
  const pipe: RankVoice = {
    code: 'P-72',
    voice: { kind: 'stopped-pipe', note: 'C#5', lengthMm: 150.98, boreMm: 11, wallMm: 1.6 },
  };

  it('says of a pipe its bore, wall, outer width and pitch', () => {
    const [voice] = bookVoices([pipe], { temperatureC: 20 });
    expect(voice).toMatchObject({ note: 'C♯5', dimensions: 'bore 11 mm, wall 1.6 mm', lengthMm: 150.98 });
    expect(voice?.widthMm).toBeCloseTo(14.2, 9);
    // 554.37 Hz is C♯5 in equal temperament at A4 = 440 Hz; the demo pipe of this length is drawn for it.
    expect(voice?.predicted?.hz).toBeCloseTo(554.37, 0);
  });

  it('draws a vessel as the ball that holds its air', () => {
    const [voice] = bookVoices(
      [
        {
          code: 'V-1',
          voice: { kind: 'vessel', note: 'F5', volumeCm3: 4.18879, holes: [{ diameterMm: 6 }], wallMm: 2 },
        },
      ],
      { temperatureC: 20 },
    );
    // A ball of 20 mm diameter holds 4π/3 cm³.
    expect(voice?.widthMm).toBeCloseTo(24, 3);
    expect(voice?.lengthMm).toBeNull();
  });

  it('goes without a prediction where the formulas do not reach', () => {
    const thin = { ...pipe, voice: { ...pipe.voice, lengthMm: 0.001 } } as RankVoice;
    expect(bookVoices([thin], { temperatureC: 20 })[0]?.predicted).toBeNull();
  });
});

describe('kit colours on paper', () => {
  // WCAG 2.2, relative luminance and contrast ratio.
  const luminance = (hex: string): number =>
    [1, 3, 5]
      .map((at) => Number.parseInt(hex.slice(at, at + 2), 16) / 255)
      .map((value) => (value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4))
      .reduce((sum, value, at) => sum + value * ([0.2126, 0.7152, 0.0722][at] ?? 0), 0);
  const onWhite = (hex: string): number => 1.05 / (luminance(hex) + 0.05);

  it.each(['orange', 'teal', 'violet', 'ochre', 'blue', 'rose', 'moss'] as const)(
    'lets %s be seen, and its lettering be read',
    (colour) => {
      const { kit, deep, wash } = kitShades(filamentHex(colour));
      expect(onWhite(kit)).toBeGreaterThan(3);
      expect(onWhite(deep)).toBeGreaterThan(4.5);
      expect(onWhite(wash)).toBeLessThan(1.25);
    },
  );

  // The example of CSS Color Module Level 4 for one colour in all its notations, and its red (from memory).
  it.each([
    ['#7d2329', [0.40101, 0.12332, 21.555]],
    ['#ff0000', [0.62796, 0.25768, 29.234]],
  ] as const)('converts %s as CSS Color 4 does', (hex, oklch) => {
    expect(oklchToHex(oklch)).toBe(hex);
    const [lightness, chroma, hueDeg] = hexToOklch(hex);
    expect(lightness).toBeCloseTo(oklch[0], 2);
    expect(chroma).toBeCloseTo(oklch[1], 2);
    expect(Math.abs(hueDeg - oklch[2])).toBeLessThan(0.5);
  });
});
