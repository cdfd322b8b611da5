import { Box } from '@chakra-ui/react/box';
import { printerTexts as texts } from '../../config/texts/printer.js';
import { keepPrinterCard, usePrinterCard } from '../../lib/printer-card.js';
import { buildVolume } from '../../lib/format.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Notice } from '../../ui/notice.js';
import { usePrinters } from './use-printers.js';

const stale = ['GET /account/printers'] as const;

/** To whoever is signed in: the printer typed in before signing in can come along onto the account. */
export function KeepOffer() {
  const { isSignedIn, choose } = usePrinters();
  const typedIn = usePrinterCard();
  const { run, fault, isRunning } = useAction('POST /account/printers', stale);
  if (!isSignedIn || !typedIn) return null;
  const keep = async () => {
    const outcome = await run({ body: { ...typedIn, isMain: false } });
    if (!outcome.isDone) return;
    choose(outcome.data.id);
    keepPrinterCard(null);
  };
  return (
    <Notice title={texts.offerTitle}>
      {texts.option(typedIn.name, buildVolume(typedIn.bed))} mm. {texts.offer}
      {fault && <Fault what={texts.offerFailed} fault={fault} level={3} />}
      <Box display="flex" flexWrap="wrap" gap="3" marginTop="3">
        <Button look="outline" size="sm" onClick={keep} isBusy={isRunning} busyWords={texts.keeping}>
          {texts.offerKeep}
        </Button>
        <Button look="plain" size="sm" onClick={() => keepPrinterCard(null)}>
          {texts.forget}
        </Button>
      </Box>
    </Notice>
  );
}
