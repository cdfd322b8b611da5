import type { Oklch } from '../ui/theme/kit-palette.js';

/**
 * OKLCH to linear-light sRGB; a channel outside 0..1 is a colour a screen cannot show.
 * Matrices: CSS Color Module Level 4, "Sample code for Color Conversions" (after B. Ottosson, "A perceptual
 * color space for image processing", 2020).
 */
export function linearRgb([lightness, chroma, hueDeg]: Oklch): [number, number, number] {
  const a = chroma * Math.cos((hueDeg * Math.PI) / 180);
  const b = chroma * Math.sin((hueDeg * Math.PI) / 180);
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s,
    -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
    -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s,
  ];
}

export const isShownBySrgb = (colour: Oklch): boolean =>
  linearRgb(colour).every((channel) => channel > -0.0005 && channel < 1.0005);

/** Relative luminance, WCAG 2.2 (definition of the same name). */
export function luminance(colour: Oklch): number {
  const [r, g, b] = linearRgb(colour).map((channel) => Math.min(1, Math.max(0, channel))) as [
    number,
    number,
    number,
  ];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** Contrast ratio 1..21, WCAG 2.2 (definition of the same name). */
export function contrast(one: Oklch, other: Oklch): number {
  const [darker, lighter] = [luminance(one), luminance(other)].sort((a, b) => a - b) as [number, number];
  return (lighter + 0.05) / (darker + 0.05);
}
