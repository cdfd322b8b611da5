import { Box } from '@chakra-ui/react/box';
import type { PrintSheetPart, ReprintPlan } from '@windchest/contracts';
import { lazy, Suspense, useMemo, useState } from 'react';
import { platesTexts } from '../../config/texts/plates.js';
import { reprintTexts as texts } from '../../config/texts/reprint.js';
import { buildVolume } from '../../lib/format.js';
import { Button } from '../../ui/button.js';
import { Progress } from '../../ui/progress.js';
import { Text } from '../../ui/text.js';
import { PlatesPlan } from '../bench/plates-plan.js';
import { PrinterLine } from '../bench/printer-line.js';
import { usePrinters } from '../bench/use-printers.js';

const OwnPrinterDialog = lazy(async () => ({
  default: (await import('../bench/own-printer-dialog.js')).OwnPrinterDialog,
}));

/** Only what is on the list, in the pieces wanted. */
export const wantedParts = ({ list, sheet }: ReprintPlan, hasOptional: boolean): PrintSheetPart[] =>
  sheet.parts.flatMap((part) => {
    const row = list.parts.find(({ code }) => code === part.code);
    const quantity = (row?.print ?? 0) + (hasOptional ? (row?.optional ?? 0) : 0);
    return quantity > 0 ? [{ ...part, quantity }] : [];
  });

/** Plates, filament and hours for what is on the list, on the reader's own printer. */
export function ReprintPlates({ plan, hasOptional }: { plan: ReprintPlan; hasOptional: boolean }) {
  const { chosen, isLoading } = usePrinters();
  const [isOpen, setIsOpen] = useState(false);
  const parts = useMemo(() => wantedParts(plan, hasOptional), [plan, hasOptional]);
  if (isLoading) return <Progress label={platesTexts.loading} />;
  if (!chosen)
    return (
      <Box>
        <Text marginBottom="4">{texts.noPrinter}</Text>
        <Button look="outline" aria-haspopup="dialog" onClick={() => setIsOpen(true)}>
          {texts.writePrinter}
        </Button>
        {isOpen && (
          <Suspense>
            <OwnPrinterDialog onClose={() => setIsOpen(false)} />
          </Suspense>
        )}
      </Box>
    );
  return (
    <>
      <PrinterLine />
      {parts.length > 0 && (
        <PlatesPlan
          key={`${chosen.key} ${buildVolume(chosen.bed)}`}
          parts={parts}
          unmeasured={plan.sheet.unmeasured}
          printSpec={plan.sheet.printSpec}
          printer={chosen}
        />
      )}
    </>
  );
}
