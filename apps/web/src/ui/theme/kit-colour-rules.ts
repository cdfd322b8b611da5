import { cssColour, kitPalettes, kitShades, type KitShades } from './kit-palette.js';

const variable: Record<keyof KitShades, string> = {
  kit: '--wc-colors-kit',
  lit: '--wc-colors-kit-lit',
  line: '--wc-colors-kit-line',
  deep: '--wc-colors-kit-deep',
  wash: '--wc-colors-kit-wash',
};

/** Custom properties for `[data-kit=…]`, so that whatever stands inside may say `color="kit.deep"`. */
export function kitColourRules(): Record<string, Record<string, string>> {
  const rules: Record<string, Record<string, string>> = {};
  for (const palette of kitPalettes) {
    for (const scheme of ['light', 'dark'] as const) {
      const selector = `${scheme === 'dark' ? '.dark ' : ''}[data-kit=${palette}]`;
      const shades = Object.entries(kitShades(palette, scheme)) as [keyof KitShades, KitShades['kit']][];
      rules[selector] = Object.fromEntries(
        shades.map(([name, colour]) => [variable[name], cssColour(colour)]),
      );
    }
  }
  return rules;
}
