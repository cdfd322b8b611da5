import { Box } from '@chakra-ui/react/box';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { counted, grams, hoursRange, number } from '../../lib/format.js';
import { Text } from '../../ui/text.js';
import type { PiecesOfPart } from './plan-figures.js';

export interface PlateLegendProps {
  pieces: readonly PiecesOfPart[];
  nameOf: (code: string) => string;
  hours: { low: number; high: number };
  massG: number | null;
}

/** What lies on the plate beside it, and what it takes. */
export function PlateLegend({ pieces, nameOf, hours, massG }: PlateLegendProps) {
  const count = pieces.reduce((sum, one) => sum + one.quantity, 0);
  const facts = [
    counted(count, texts.onePiece, texts.manyPieces),
    hours.high > 0 && hoursRange(hours.low, hours.high),
    massG !== null && grams(massG),
  ];
  return (
    <Box minWidth="0">
      <Text fontWeight="semibold" marginBottom="2">
        {facts.filter(Boolean).join(' · ')}
      </Text>
      <Box
        as="ul"
        listStyle="none"
        fontSize="sm"
        borderTopWidth="1px"
        borderColor="hairline"
        display="grid"
        columnGap="5"
        gridTemplateColumns="repeat(auto-fill, minmax(8.75rem, 1fr))"
      >
        {pieces.map(({ code, quantity, isLaid }) => (
          <Box
            as="li"
            key={code}
            display="flex"
            gap="2"
            paddingBlock="1"
            borderBottomWidth="1px"
            borderColor="hairline"
          >
            <Box as="span" fontWeight="semibold" whiteSpace="nowrap">
              {quantity > 1 ? texts.timesPart(number(quantity), code) : code}
            </Box>
            <Box as="span" color="ink.soft" minWidth="0">
              {nameOf(code)}
              {isLaid && `, ${texts.placed.laid}`}
            </Box>
          </Box>
        ))}
      </Box>
    </Box>
  );
}
