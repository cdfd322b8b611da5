import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { FilamentColour } from '@windchest/contracts';
import type { ComponentProps } from 'react';
import { kitFormTexts as texts } from '../../config/texts/workshop-kits.js';
import { Rank } from '../../ui/drawing/rank.js';
import type { DrawnVoice } from '../../ui/drawing/rank-layout.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { kitPalettes } from '../../ui/theme/kit-palette.js';
import { sampleVoices } from './drawn-parts.js';

const Input = chakra('input', { base: { srOnly: true } });
const Swatch = chakra('span', {
  base: {
    display: 'flex',
    alignItems: 'center',
    gap: '2',
    paddingBlock: '1.5',
    paddingInline: '2.5',
    borderWidth: '1px',
    borderColor: 'edge',
    borderRadius: 'sm',
    cursor: 'pointer',
    'input:checked + &': {
      borderColor: 'ink',
      outline: '1px solid',
      outlineColor: 'ink',
      outlineOffset: '-2px',
      fontWeight: 'semibold',
    },
    'input:focus-visible + &': { outline: '2px solid', outlineColor: 'ink', outlineOffset: '2px' },
    'input:disabled + &': { cursor: 'not-allowed', color: 'ink.soft' },
  },
});

export interface ColourFieldProps extends ComponentProps<typeof Input> {
  chosen: FilamentColour;
  /** The kit's own voices, where it has some. */
  voices?: readonly DrawnVoice[];
}

/** One colour of the palette, with the rank wearing it. Spread `register('colour')`. */
export const ColourField = ({ chosen, voices = sampleVoices, ...input }: ColourFieldProps) => (
  <Box as="fieldset" border="0" padding="0" margin="0" minWidth="0">
    <Box as="legend" fontSize="sm" fontWeight="semibold">
      {texts.colour}
    </Box>
    <Box fontSize="sm" color="ink.soft" marginBottom="2">
      {texts.colourHint}
    </Box>
    <Box display="flex" flexWrap="wrap" gap="2">
      {kitPalettes.map((palette) => (
        <label key={palette}>
          <Input {...input} type="radio" value={palette} />
          <Swatch>
            <KitColour
              palette={palette}
              width="1.25rem"
              height="1.25rem"
              bg="kit"
              borderRadius="sm"
              aria-hidden
            />
            {texts.colours[palette]}
          </Swatch>
        </label>
      ))}
    </Box>
    <KitColour palette={chosen} marginTop="5" maxWidth="22rem">
      <Rank voices={voices} maxHeightPx={120} description={texts.swatch(texts.colours[chosen])} />
    </KitColour>
  </Box>
);
