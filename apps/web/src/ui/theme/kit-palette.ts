/** A colour in OKLCH: lightness 0..1, chroma, hue in degrees (CSS Color Module Level 4, §9). */
export type Oklch = readonly [lightness: number, chroma: number, hueDeg: number];

export const kitPalettes = ['orange', 'teal', 'violet', 'ochre', 'blue', 'rose', 'moss'] as const;
export type KitPalette = (typeof kitPalettes)[number];

/** What a kit's colour is worn as: the filament, a lit edge and a layer line of it, text, a wash behind text. */
export interface KitShades {
  kit: Oklch;
  lit: Oklch;
  line: Oklch;
  deep: Oklch;
  wash: Oklch;
}

interface Filament {
  hueDeg: number;
  /** Of the filament under white light; above .65 the fill would not stand out from the ground. */
  lightness: number;
  chroma: number;
  /** How strong text of this hue may be before it leaves sRGB. */
  deepChroma: number;
}

const filaments: Record<KitPalette, Filament> = {
  orange: { hueDeg: 46, lightness: 0.645, chroma: 0.16, deepChroma: 0.12 },
  teal: { hueDeg: 163, lightness: 0.61, chroma: 0.11, deepChroma: 0.08 },
  violet: { hueDeg: 287, lightness: 0.6, chroma: 0.13, deepChroma: 0.14 },
  ochre: { hueDeg: 80, lightness: 0.64, chroma: 0.125, deepChroma: 0.09 },
  blue: { hueDeg: 250, lightness: 0.61, chroma: 0.12, deepChroma: 0.11 },
  rose: { hueDeg: 8, lightness: 0.63, chroma: 0.15, deepChroma: 0.13 },
  moss: { hueDeg: 125, lightness: 0.62, chroma: 0.12, deepChroma: 0.09 },
};

export function kitShades(palette: KitPalette, scheme: 'light' | 'dark'): KitShades {
  const { hueDeg, lightness, chroma, deepChroma } = filaments[palette];
  if (scheme === 'light') {
    return {
      kit: [lightness, chroma, hueDeg],
      lit: [lightness + 0.07, chroma * 0.78, hueDeg],
      line: [lightness - 0.06, chroma * 0.9, hueDeg],
      deep: [0.46, deepChroma, hueDeg],
      wash: [0.945, 0.025, hueDeg],
    };
  }
  return {
    kit: [lightness + 0.02, chroma * 0.92, hueDeg],
    lit: [lightness + 0.09, chroma * 0.74, hueDeg],
    line: [lightness - 0.06, chroma * 0.9, hueDeg],
    deep: [0.81, deepChroma * 0.7, hueDeg],
    wash: [0.33, 0.04, hueDeg],
  };
}

export const cssColour = ([lightness, chroma, hueDeg]: Oklch): string =>
  `oklch(${+(lightness * 100).toFixed(2)}% ${+chroma.toFixed(4)} ${hueDeg})`;
