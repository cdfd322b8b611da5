import { defineSemanticTokens, defineTokens } from '@chakra-ui/react/styled-system';
import { schemes } from './colours.js';
import { cssColour } from './kit-palette.js';

const rem = (...steps: number[]) =>
  Object.fromEntries(steps.map((step) => [step, { value: `${step / 4}rem` }]));
const px = (sizes: Record<string, number>) =>
  Object.fromEntries(Object.entries(sizes).map(([name, size]) => [name, { value: `${size / 16}rem` }]));

/** Steps of a quarter rem, as many as are used. */
const steps = rem(0, 0.5, 1, 1.5, 2, 2.5, 3, 3.5, 4, 5, 6, 7, 8, 9, 10, 11, 12, 14, 16, 18, 20, 24, 32);

export const tokens = defineTokens({
  fonts: {
    body: { value: '"Source Sans 3 Variable", "Source Sans 3", system-ui, sans-serif' },
    heading: { value: '{fonts.body}' },
    mono: { value: 'ui-monospace, "Cascadia Mono", "DejaVu Sans Mono", monospace' },
  },
  fontSizes: px({
    '2xs': 11,
    xs: 12,
    sm: 14,
    md: 16,
    lg: 18,
    xl: 20,
    '2xl': 25,
    '3xl': 31,
    '4xl': 42,
    '5xl': 52,
  }),
  fontWeights: {
    normal: { value: '400' },
    medium: { value: '500' },
    semibold: { value: '600' },
    bold: { value: '680' },
  },
  lineHeights: { tight: { value: '1.06' }, snug: { value: '1.3' }, normal: { value: '1.5' } },
  letterSpacings: { display: { value: '-0.022em' }, heading: { value: '-0.008em' } },
  spacing: steps,
  sizes: {
    ...steps,
    full: { value: '100%' },
    measure: { value: '38rem' },
    narrow: { value: '27rem' },
    page: { value: '90rem' },
  },
  radii: { none: { value: '0' }, sm: { value: '2px' }, full: { value: '999px' } },
  durations: { fast: { value: '120ms' }, slow: { value: '200ms' } },
});

const bothSchemes = (light: string, dark: string) => ({ value: { base: light, _dark: dark } });
const neutral = (name: keyof typeof schemes.light) =>
  bothSchemes(cssColour(schemes.light[name]), cssColour(schemes.dark[name]));

export const semanticTokens = defineSemanticTokens({
  colors: {
    ground: neutral('ground'),
    sheet: neutral('sheet'),
    ink: { DEFAULT: neutral('ink'), soft: neutral('inkSoft'), contrast: neutral('sheet') },
    hairline: neutral('hairline'),
    edge: neutral('edge'),
    ok: neutral('ok'),
    warn: neutral('warn'),
    stop: neutral('stop'),
    // Without a kit around, things of a kit are drawn in neutral; `[data-kit]` overrides these five.
    kit: {
      DEFAULT: neutral('edge'),
      lit: neutral('inkSoft'),
      line: neutral('inkSoft'),
      deep: neutral('ink'),
      wash: neutral('hairline'),
    },
  },
});
