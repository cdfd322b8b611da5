import { Box } from '@chakra-ui/react/box';
import { useId } from 'react';
import { colourTexts } from '../config/texts/shop.js';
import { schemeChoices, useColourScheme } from '../lib/colour-scheme.js';
import { VisuallyHidden } from './visually-hidden.js';

/** Light, dark, or as the system has it; kept in the browser. */
export function ColourSwitch() {
  const [choice, choose] = useColourScheme();
  const name = useId();
  return (
    <Box as="fieldset" border="0" display="flex" alignItems="center" gap="4">
      <VisuallyHidden as="legend">{colourTexts.legend}</VisuallyHidden>
      {schemeChoices.map((option) => (
        <Box
          as="label"
          key={option}
          cursor="pointer"
          color={option === choice ? 'ink' : 'ink.soft'}
          borderBottomWidth="2px"
          borderColor={option === choice ? 'ink' : 'transparent'}
          _hover={{ color: 'ink' }}
          css={{
            '&:has(:focus-visible)': { outline: '2px solid', outlineColor: 'ink', outlineOffset: '3px' },
          }}
        >
          <VisuallyHidden asChild>
            <input type="radio" name={name} checked={option === choice} onChange={() => choose(option)} />
          </VisuallyHidden>
          {colourTexts[option]}
        </Box>
      ))}
    </Box>
  );
}
