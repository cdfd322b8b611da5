import { Box } from '@chakra-ui/react/box';
import type { KitPage, KitPart } from '@windchest/contracts';
import { lazy, Suspense, useState } from 'react';
import { kitTexts } from '../../config/texts/kit.js';
import { buildVolume, counted, grams, hoursRange, number } from '../../lib/format.js';
import { usePrinterCard } from '../../lib/printer-card.js';
import { Button } from '../../ui/button.js';
import { Text } from '../../ui/text.js';
import { FitLines } from './fit-lines.js';

const PrinterCardDialog = lazy(async () => ({
  default: (await import('../bench/printer-card-dialog.js')).PrinterCardDialog,
}));

const Estimate = ({ estimate }: { estimate: NonNullable<KitPage['printEstimate']> }) => (
  <Text isSoft>
    {kitTexts.fitEstimate(
      buildVolume(estimate.bed),
      counted(estimate.plates, kitTexts.onePlate, kitTexts.manyPlates),
      hoursRange(estimate.hoursLow, estimate.hoursHigh),
      grams(estimate.massG),
      `${number(estimate.lengthM)} m`,
    )}
  </Text>
);

export interface FitSectionProps {
  kit: KitPage;
  parts: readonly KitPart[] | undefined;
}

/** Each part against the visitor's own printer, once it is written down. */
export function FitSection({ kit, parts }: FitSectionProps) {
  const [printer] = usePrinterCard();
  const [isOpen, setIsOpen] = useState(false);
  return (
    <Box display="grid" gap="4" justifyItems="start">
      {printer ? (
        <FitLines kit={kit} parts={parts} printer={printer} />
      ) : (
        <Text>{kitTexts.fitNobody(buildVolume(kit.buildVolume))}</Text>
      )}
      {kit.printEstimate && <Estimate estimate={kit.printEstimate} />}
      <Button
        look={printer ? 'plain' : 'outline'}
        size={printer ? 'sm' : 'md'}
        aria-haspopup="dialog"
        onClick={() => setIsOpen(true)}
      >
        {printer ? kitTexts.fitChange : kitTexts.fitOpen}
      </Button>
      {isOpen && (
        <Suspense>
          <PrinterCardDialog onClose={() => setIsOpen(false)} />
        </Suspense>
      )}
    </Box>
  );
}
