import { Box } from '@chakra-ui/react/box';
import type { Licence } from '@windchest/contracts';
import { useId } from 'react';
import { kitTexts } from '../../config/texts/kit.js';
import { Details } from '../../ui/details.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';
import { Text } from '../../ui/text.js';
import { orFree } from './or-free.js';

export interface LicenceChoiceProps {
  licences: readonly Licence[];
  chosen: Licence;
  onChoose: (licenceId: string) => void;
}

/** What one may do with the files, each with its price; the terms of the chosen one under them. */
export function LicenceChoice({ licences, chosen, onChoose }: LicenceChoiceProps) {
  const name = useId();
  return (
    <Box>
      <RadioRows legend={kitTexts.licences} isLegendHidden>
        {licences.map((licence) => (
          <RadioRow
            key={licence.id}
            name={name}
            value={licence.id}
            label={licence.name}
            worth={orFree(licence.price)}
            checked={licence.id === chosen.id}
            onChange={() => onChoose(licence.id)}
          />
        ))}
      </RadioRows>
      <Box marginTop="2.5" fontSize="sm">
        <Details key={chosen.id} summary={kitTexts.termsOf(chosen.name)} gap="2">
          <Text look="small" isSoft whiteSpace="pre-line">
            {chosen.terms}
          </Text>
        </Details>
      </Box>
    </Box>
  );
}
