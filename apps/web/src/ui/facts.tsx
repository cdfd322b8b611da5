import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';

export interface FactsProps {
  facts: readonly { value: ReactNode; name: string }[];
}

/** A few figures in a row, each with its name beneath: "6 plates", "640 g filament". */
export const Facts = ({ facts }: FactsProps) => (
  <Box as="dl" display="flex" flexWrap="wrap" columnGap="6" rowGap="2">
    {facts.map((fact) => (
      <Box key={fact.name} display="flex" flexDirection="column-reverse" lineHeight="snug">
        <Box as="dt" fontSize="xs" fontWeight="medium" color="ink.soft">
          {fact.name}
        </Box>
        <Box as="dd" fontSize="sm" fontWeight="semibold">
          {fact.value}
        </Box>
      </Box>
    ))}
  </Box>
);
