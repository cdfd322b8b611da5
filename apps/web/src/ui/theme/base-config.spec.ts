import { defaultBaseConfig } from '@chakra-ui/react/preset-base';
import { createSystem } from '@chakra-ui/react/styled-system';
import { baseConfig } from './base-config.js';
import { semanticTokens, tokens } from './tokens.js';

const theme = { theme: { tokens, semanticTokens, breakpoints: { md: '48rem' } } };
const ours = createSystem(baseConfig, theme);
const chakras = createSystem(defaultBaseConfig, theme);

/** Values a page might give: tokens of every kind, plain CSS, a mixed colour. */
const samples = [
  '2',
  '0.5',
  'full',
  'measure',
  'sm',
  'ink',
  'ink.soft',
  'stop/8',
  'bold',
  'snug',
  'fast',
  'colors',
  '13px',
];

/** Chakra's background keeps its colour in a variable for a child that asks for it; no child here does. */
const plain = (css: object) =>
  Object.fromEntries(Object.entries(css).filter(([name]) => name !== '--bg-currentcolor'));

/** What a property, or its short form, becomes. `--chakra…` and `--wc…` are alike here: no prefix is set. */
const becomes = (system: typeof ours, property: string, value: unknown) =>
  plain(system.css({ [property]: value } as Parameters<typeof system.css>[0]));

const kept = Object.keys(baseConfig.utilities ?? {});
const shortForms = kept.flatMap((property) => baseConfig.utilities?.[property]?.shorthand ?? []);

describe('the base configuration', () => {
  it.each([...kept, ...shortForms].filter((name) => !['srOnly', 'truncate'].includes(name)))(
    'does with %s what Chakra’s own does',
    (property) => {
      for (const value of samples) {
        expect(becomes(ours, property, value)).toEqual(becomes(chakras, property, value));
      }
    },
  );

  it.each(['srOnly', 'truncate'])('does with %s what Chakra’s own does', (property) => {
    expect(becomes(ours, property, true)).toEqual(becomes(chakras, property, true));
  });

  it('has the same conditions', () => {
    expect(baseConfig.conditions).toEqual(defaultBaseConfig.conditions);
  });

  it('treats as plain CSS only properties that have no tokens here, apart from those left out on purpose', () => {
    const leftOut =
      /^(focus|ring|gradient|divide|space|scroll|skew|scale|rotate|translate|backdrop|border(Inline|Block|Start|End|Top|Bottom|Left|Right)\w*(Radius|Color)|border(Start|End)\w*Radius|boxShadowColor|borderSpacing|hide|lineClamp|debug|blur|brightness|contrast|grayscale|hueRotate|invert|saturate|sepia|dropShadow|filter|transitionProperty|transform|grid\w*Gap|background\w+|boxShadow|textShadow)/;
    const differing = Object.keys(defaultBaseConfig.utilities ?? {})
      .filter((property) => !kept.includes(property) && !leftOut.test(property))
      .filter((property) =>
        samples.some(
          (value) =>
            JSON.stringify(becomes(ours, property, value)) !==
            JSON.stringify(becomes(chakras, property, value)),
        ),
      );
    expect(differing).toEqual([]);
  });
});
