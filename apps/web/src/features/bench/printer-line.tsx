import { Box } from '@chakra-ui/react/box';
import { lazy, Suspense, useState } from 'react';
import { kitTexts } from '../../config/texts/kit.js';
import { printerTexts as texts } from '../../config/texts/printer.js';
import { buildVolume } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { Button } from '../../ui/button.js';
import { SelectField } from '../../ui/field/select-field.js';
import { Text } from '../../ui/text.js';
import { KeepOffer } from './keep-offer.js';
import { printerWords } from './printer-words.js';
import { browserKey, usePrinters } from './use-printers.js';

const OwnPrinterDialog = lazy(async () => ({
  default: (await import('./own-printer-dialog.js')).OwnPrinterDialog,
}));

/** The printer a plan is made for: which, what it is, and how to take another. */
export function PrinterLine() {
  const { session, isSignedIn } = useSession();
  const { printers, chosen, choose } = usePrinters();
  const [open, setOpen] = useState<'change' | 'new'>();
  if (!chosen) return null;
  const words = printerWords(chosen, session?.workshop.currency ?? 'EUR');
  return (
    <Box display="grid" gap="4" marginBottom="6" gridTemplateColumns="minmax(0, 1fr)">
      <Box>
        {printers.length > 1 ? (
          <Box maxWidth="24rem" marginBottom="2">
            <SelectField
              label={texts.choose}
              options={printers.map(({ key, name, bed }) => ({
                value: key,
                label: texts.option(
                  key === browserKey && isSignedIn ? `${name} (${texts.inBrowser})` : name,
                  buildVolume(bed),
                ),
              }))}
              value={chosen.key}
              onChange={(event) => choose(event.currentTarget.value)}
            />
          </Box>
        ) : (
          <Text fontWeight="semibold">{texts.option(chosen.name, buildVolume(chosen.bed))} mm</Text>
        )}
        <Box display="flex" flexWrap="wrap" alignItems="baseline" columnGap="4" rowGap="1">
          <Text isSoft maxWidth="none">
            {words}
          </Text>
          <Button look="plain" size="sm" aria-haspopup="dialog" onClick={() => setOpen('change')}>
            {kitTexts.fitChange}
          </Button>
          {isSignedIn && (
            <Button look="plain" size="sm" aria-haspopup="dialog" onClick={() => setOpen('new')}>
              {texts.writeAnother}
            </Button>
          )}
        </Box>
      </Box>
      <KeepOffer />
      {open && (
        <Suspense>
          <OwnPrinterDialog isNew={open === 'new'} onClose={() => setOpen(undefined)} />
        </Suspense>
      )}
    </Box>
  );
}
