import type { CountryRates } from '@windchest/contracts';
import { useState } from 'react';
import { ratesTexts as texts } from '../../config/texts/workshop-tax.js';
import { countryName, day } from '../../lib/workshop-format.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';
import { rateAnswers } from './rate-answers.js';

export interface TakeBackRateProps {
  row: CountryRates;
  next: NonNullable<CountryRates['next']>;
}

/** Takes a rate back that does not hold yet, after asking. */
export function TakeBackRate({ row, next }: TakeBackRateProps) {
  const [isAsking, setIsAsking] = useState(false);
  const { run, fault } = useAction('DELETE /workshop/ledger/rates/:country/:kind/:validFrom', rateAnswers);
  const country = countryName(row.country);
  return (
    <>
      <Button
        look="plain"
        size="sm"
        aria-label={texts.takeBackOf(next.ratePercent, country)}
        onClick={() => setIsAsking(true)}
      >
        {texts.takeBack}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        title={texts.takeBackAsk(next.ratePercent, country, day(next.validFrom))}
        confirmLabel={texts.takeBackConfirm}
        onConfirm={async () => {
          const params = { country: row.country, kind: row.kind, validFrom: next.validFrom };
          return (await run({ params })).isDone;
        }}
      >
        <Text>{texts.takeBackWhat}</Text>
        {fault && <Fault what={texts.takeBackFailed} fault={fault} />}
      </ConfirmDialog>
    </>
  );
}
