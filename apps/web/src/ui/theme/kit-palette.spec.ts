import { contrast, isShownBySrgb, linearRgb } from '../../testing/contrast.js';
import { schemes } from './colours.js';
import { cssColour, kitPalettes, kitShades, type Oklch } from './kit-palette.js';

describe('the contrast formula', () => {
  it('gives 21:1 for black on white (WCAG 2.2, contrast ratio)', () => {
    expect(contrast([0, 0, 0], [1, 0, 0])).toBeCloseTo(21, 4);
  });

  it('knows pure red as oklch(62.8% 0.25768 29.234) (CSS Color 4, worked examples of sRGB primaries)', () => {
    const [r, g, b] = linearRgb([0.62796, 0.25768, 29.234]);
    expect(r).toBeCloseTo(1, 3);
    expect(g).toBeCloseTo(0, 3);
    expect(b).toBeCloseTo(0, 3);
  });
});

describe.each(['light', 'dark'] as const)('colours in %s', (scheme) => {
  const { ground, sheet, ink, inkSoft, edge, hairline, ok, warn, stop } = schemes[scheme];

  it.each(Object.entries({ ink, inkSoft, ok, warn, stop }))(
    'read %s on ground and sheet at 4.5:1',
    (_name, colour) => {
      expect(contrast(colour, ground)).toBeGreaterThanOrEqual(4.5);
      expect(contrast(colour, sheet)).toBeGreaterThanOrEqual(4.5);
    },
  );

  it('outline controls at 3:1', () => {
    expect(contrast(edge, ground)).toBeGreaterThanOrEqual(3);
    expect(contrast(edge, sheet)).toBeGreaterThanOrEqual(3);
  });

  it('keep soft ink readable on a disabled action, which has the hairline colour', () => {
    expect(contrast(inkSoft, hairline)).toBeGreaterThanOrEqual(4.5);
  });

  it('stay within what a screen can show', () => {
    const beyond = Object.entries(schemes[scheme]).filter(([, colour]) => !isShownBySrgb(colour));
    expect(beyond.map(([name]) => name)).toEqual([]);
  });

  describe.each(kitPalettes)('%s', (palette) => {
    const shades = kitShades(palette, scheme);

    it('reads as text on ground, sheet and its own wash at 4.5:1', () => {
      for (const behind of [ground, sheet, shades.wash]) {
        expect(contrast(shades.deep, behind)).toBeGreaterThanOrEqual(4.5);
      }
    });

    it('fills a drawing at 3:1 against sheet and ground', () => {
      expect(contrast(shades.kit, sheet)).toBeGreaterThanOrEqual(3);
      expect(contrast(shades.kit, ground)).toBeGreaterThanOrEqual(3);
    });

    it('stays within what a screen can show', () => {
      const beyond = Object.entries(shades).filter(([, colour]) => !isShownBySrgb(colour as Oklch));
      expect(beyond.map(([name]) => name)).toEqual([]);
    });
  });
});

describe('cssColour', () => {
  it('writes a colour as CSS has it', () => {
    expect(cssColour([0.66, 0.15, 46])).toBe('oklch(66% 0.15 46)');
  });
});
