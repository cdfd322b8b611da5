import { darkPalette, lightPalette } from './palette.js';

/** Relative luminance and contrast as WCAG 2.2 defines them. */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}
function contrast(a: string, b: string): number {
  const [darker = 0, lighter = 0] = [luminance(a), luminance(b)].toSorted((x, y) => x - y);
  return (lighter + 0.05) / (darker + 0.05);
}

describe.each([
  ['light', lightPalette],
  ['dark', darkPalette],
])('the %s palette', (_name, { ground, sheet, ink, soft }) => {
  it('keeps text readable on ground and sheet (WCAG 2.2, 1.4.3: 4.5 to 1)', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
    for (const text of [ink, soft]) {
      expect(contrast(text, sheet)).toBeGreaterThanOrEqual(4.5);
      expect(contrast(text, ground)).toBeGreaterThanOrEqual(4.5);
    }
  });
});
