/**
 * The shop's neutral tokens as sRGB: mail clients do not read OKLCH. Light: ground 96.8% .006 235, sheet
 * 99.3% .002 235, ink 25% .035 258, soft 47% .03 255, hairline 86% .012 245. Dark: 19% .028 258,
 * 23.5% .033 258, 94% .01 240, 77% .02 245, 39% .03 252.
 */
export type Palette = { ground: string; sheet: string; ink: string; soft: string; hairline: string };

export const lightPalette: Palette = {
  ground: '#f1f5f8',
  sheet: '#fbfdfe',
  ink: '#172232',
  soft: '#505c6c',
  hairline: '#cbd2d8',
};

export const darkPalette: Palette = {
  ground: '#0c1420',
  sheet: '#141e2e',
  ink: '#e5ecf1',
  soft: '#aab6c0',
  hairline: '#394655',
};
