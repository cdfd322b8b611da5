import type { QuarterSummary } from '@windchest/contracts';
import { useState } from 'react';
import { quarterTexts as texts, quartersTexts } from '../../config/texts/workshop-tax.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';

/** Closes a quarter that is over, after asking: it cannot be opened again. */
export function CloseQuarter({ summary }: { summary: QuarterSummary }) {
  const [isAsking, setIsAsking] = useState(false);
  const { run, fault } = useAction('POST /workshop/ledger/quarters/:year/:quarter/close', [
    'GET /workshop/ledger/quarters',
    'GET /workshop/ledger/quarters/:year/:quarter',
  ]);
  const { year, quarter } = summary;
  return (
    <>
      <Button look="outline" onClick={() => setIsAsking(true)}>
        {texts.close}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        title={texts.closeAsk(quartersTexts.name(year, quarter))}
        confirmLabel={texts.closeConfirm}
        onConfirm={async () => (await run({ params: { year, quarter } })).isDone}
      >
        <Text>{texts.closeWhat}</Text>
        {fault && <Fault what={texts.closeFailed} fault={fault} />}
      </ConfirmDialog>
    </>
  );
}
