import { Box } from '@chakra-ui/react/box';
import type { KitPage } from '@windchest/contracts';
import { lazy, Suspense, useState } from 'react';
import { kitTexts } from '../../config/texts/kit.js';
import { buildVolume, counted, grams, hoursRange, number } from '../../lib/format.js';
import { Button } from '../../ui/button.js';
import { Text } from '../../ui/text.js';
import { usePrinters } from '../bench/use-printers.js';

const OwnPrinterDialog = lazy(async () => ({
  default: (await import('../bench/own-printer-dialog.js')).OwnPrinterDialog,
}));
const PrinterLine = lazy(async () => ({
  default: (await import('../bench/printer-line.js')).PrinterLine,
}));
const KitPlates = lazy(async () => ({ default: (await import('./kit-plates.js')).KitPlates }));

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

/** The kit against one's own printer, once that is written down; nothing of it is fetched before. */
export function FitSection({ kit }: { kit: KitPage }) {
  const { chosen, isLoading } = usePrinters();
  const [isOpen, setIsOpen] = useState(false);
  if (chosen)
    return (
      <Suspense fallback={<Text isSoft>{kitTexts.fitWorking}</Text>}>
        <PrinterLine />
        <KitPlates slug={kit.slug} printer={chosen} />
      </Suspense>
    );
  return (
    <Box display="grid" gap="4" justifyItems="start">
      <Text>{kitTexts.fitNobody(buildVolume(kit.buildVolume))}</Text>
      {kit.printEstimate && <Estimate estimate={kit.printEstimate} />}
      {!isLoading && (
        <Button look="outline" aria-haspopup="dialog" onClick={() => setIsOpen(true)}>
          {kitTexts.fitOpen}
        </Button>
      )}
      {isOpen && (
        <Suspense>
          <OwnPrinterDialog onClose={() => setIsOpen(false)} />
        </Suspense>
      )}
    </Box>
  );
}
