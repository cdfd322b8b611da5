import { defaultConditions } from '@chakra-ui/react/preset-base';
import { defineConfig } from '@chakra-ui/react/styled-system';

/*
 * Chakra's own base configuration without what nobody here uses (rings, gradients, filters, dividing and spacing
 * of children, transforms in parts): 4 kB less on every first visit. `base-config.spec.ts` holds the two against
 * each other, so that a property is either here and does the same, or is named there as left out.
 */

interface ColourTools {
  utils: { colorMix: (value: string) => { invalid: boolean; value: string; color?: string } };
}

/** `ink/85` is ink at 85 % opacity. */
const colour = (property: string) => ({
  values: 'colors',
  transform: (value: string, { utils }: ColourTools) => {
    const mix = utils.colorMix(value);
    if (mix.invalid) return { [property]: value };
    const variable = `--mix-${property}`;
    return { [variable]: mix.value, [property]: `var(${variable}, ${mix.color})` };
  },
});

/** Properties that take tokens of one kind; `marginTop:mt` names a short form. */
const tokensOf: Record<string, string> = {
  spacing:
    'gap rowGap:gapY columnGap:gapX inset insetInline:insetX insetBlock:insetY top right bottom left insetInlineStart:insetStart insetInlineEnd:insetEnd insetBlockStart insetBlockEnd margin:m marginTop:mt marginRight:mr marginBottom:mb marginLeft:ml marginInline:mx marginBlock:my marginInlineStart:ms marginInlineEnd:me marginBlockStart marginBlockEnd padding:p paddingTop:pt paddingRight:pr paddingBottom:pb paddingLeft:pl paddingInline:px paddingBlock:py paddingInlineStart:ps paddingInlineEnd:pe paddingBlockStart paddingBlockEnd textIndent scrollMargin scrollMarginTop scrollMarginBottom scrollPadding scrollPaddingTop scrollPaddingBottom',
  sizes:
    'flexBasis width:w height:h minWidth:minW minHeight:minH maxWidth:maxW maxHeight:maxH inlineSize blockSize minInlineSize minBlockSize maxInlineSize maxBlockSize',
  radii:
    'borderRadius borderTopLeftRadius borderTopRightRadius borderBottomLeftRadius borderBottomRightRadius',
  fonts: 'fontFamily',
  fontSizes: 'fontSize',
  fontWeights: 'fontWeight',
  lineHeights: 'lineHeight',
  letterSpacings: 'letterSpacing',
  durations: 'transitionDuration animationDuration animationDelay',
};

const coloured =
  'background:bg backgroundColor:bgColor color fill stroke accentColor caretColor outlineColor textDecorationColor borderColor borderTopColor borderRightColor borderBottomColor borderLeftColor';

const entriesOf = (list: string, valueOf: (property: string) => object) =>
  list.split(' ').map((entry): [string, object] => {
    const [property = '', ...shorthand] = entry.split(':');
    return [property, { ...valueOf(property), shorthand }];
  });

const transitions: Record<string, string> = {
  colors: 'color, background-color, border-color, text-decoration-color, fill, stroke',
  opacity: 'opacity',
  transform: 'transform',
};

export const baseConfig = defineConfig({
  conditions: defaultConditions,
  utilities: {
    ...Object.fromEntries([
      ...Object.entries(tokensOf).flatMap(([values, list]) => entriesOf(list, () => ({ values }))),
      ...entriesOf(coloured, colour),
      ...entriesOf(
        'backgroundImage:bgImage position:pos flexDirection:flexDir textDecoration:textDecor',
        () => ({}),
      ),
    ]),
    boxSize: {
      values: 'sizes',
      property: 'width',
      transform: (size: string) => ({ width: size, height: size }),
    },
    transition: {
      values: Object.keys(transitions),
      transform: (value: string) =>
        transitions[value]
          ? {
              transition: transitions[value],
              transitionTimingFunction: 'cubic-bezier(0.4, 0, 0.2, 1)',
              transitionDuration: '150ms',
            }
          : { transition: value },
    },
    srOnly: {
      values: { type: 'boolean' },
      transform: (value: boolean) =>
        value
          ? {
              position: 'absolute',
              width: '1px',
              height: '1px',
              padding: '0',
              margin: '-1px',
              overflow: 'hidden',
              clip: 'rect(0, 0, 0, 0)',
              whiteSpace: 'nowrap',
              borderWidth: '0',
            }
          : {},
    },
    truncate: {
      values: { type: 'boolean' },
      transform: (value: boolean) =>
        value ? { overflow: 'hidden', textOverflow: 'ellipsis', whiteSpace: 'nowrap' } : {},
    },
  },
});
