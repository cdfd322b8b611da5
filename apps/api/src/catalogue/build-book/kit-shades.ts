import type { FilamentColour } from '@windchest/contracts';

/** Lightness 0..1, chroma, hue in degrees. */
type Oklch = readonly [lightness: number, chroma: number, hueDeg: number];

/** What a kit's colour is worn as on paper: the filament, a lit edge, a layer line, lettering, a wash. */
export interface KitShades {
  readonly kit: string;
  readonly lit: string;
  readonly line: string;
  readonly deep: string;
  readonly wash: string;
}

/** The palette of filament colours as the shop shows them in the light. */
const filaments: Record<FilamentColour, Oklch> = {
  orange: [0.645, 0.16, 46],
  teal: [0.61, 0.11, 163],
  violet: [0.6, 0.13, 287],
  ochre: [0.64, 0.125, 80],
  blue: [0.61, 0.12, 250],
  rose: [0.63, 0.15, 8],
  moss: [0.62, 0.12, 125],
};

export const filamentHex = (colour: FilamentColour): string => oklchToHex(filaments[colour]);

/**
 * @param colourHex `#rrggbb`
 * @throws Error that names what is no such colour
 */
export const kitShades = (colourHex: string): KitShades => {
  const [lightness, chroma, hueDeg] = hexToOklch(colourHex);
  return {
    kit: colourHex,
    lit: oklchToHex([Math.min(0.97, lightness + 0.07), chroma * 0.78, hueDeg]),
    line: oklchToHex([lightness - 0.06, chroma * 0.9, hueDeg]),
    deep: oklchToHex([0.46, chroma * 0.75, hueDeg]),
    wash: oklchToHex([0.955, Math.min(chroma, 0.022), hueDeg]),
  };
};

/** OKLCH to sRGB: CSS Color Module Level 4, 10.1 (the matrices are Björn Ottosson's). Clipped to the gamut. */
export const oklchToHex = ([lightness, chroma, hueDeg]: Oklch): string => {
  const a = chroma * Math.cos((hueDeg * Math.PI) / 180);
  const b = chroma * Math.sin((hueDeg * Math.PI) / 180);
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  const linear = [
    4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s,
    -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
    -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s,
  ];
  const bytes = linear.map((value) => {
    const light = Math.min(1, Math.max(0, value));
    const coded = light <= 0.0031308 ? 12.92 * light : 1.055 * light ** (1 / 2.4) - 0.055;
    return Math.round(coded * 255)
      .toString(16)
      .padStart(2, '0');
  });
  return `#${bytes.join('')}`;
};

export const hexToOklch = (hex: string): Oklch => {
  if (!/^#[0-9a-f]{6}$/i.test(hex)) throw new Error(`"${hex}" is no colour: write it as #rrggbb.`);
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const coded = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return coded <= 0.04045 ? coded / 12.92 : ((coded + 0.055) / 1.055) ** 2.4;
  });
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  const lightness = 0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s;
  const labA = 1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s;
  const labB = 0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s;
  return [lightness, Math.hypot(labA, labB), (Math.atan2(labB, labA) * 180) / Math.PI];
};
