import { Box } from '@chakra-ui/react/box';
import { settleBody, type UnclearLocation } from '@windchest/contracts';
import { useMemo, useState } from 'react';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { locationsTexts as texts } from '../../config/texts/workshop-tax.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextArea } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { countryOptions } from '../basket/country-options.js';

type Fields = z.input<typeof settleBody>;

/** Where a receipt counts, chosen by hand, with the reason. */
export function SettleForm({ location }: { location: UnclearLocation }) {
  const { session } = useSession();
  const [isSaved, setIsSaved] = useState(false);
  const { run, fault } = useAction('POST /workshop/ledger/locations/:receiptId', [
    'GET /workshop/ledger/locations',
    'GET /workshop/ledger/locations/:receiptId',
    'GET /workshop/ledger/quarters/:year/:quarter',
    'GET /workshop/orders/:orderId',
  ]);
  const { register, handleSubmit, setError, formState } = useForm<
    Fields,
    unknown,
    z.output<typeof settleBody>
  >({
    defaultValues: { country: location.settled?.country ?? '', reason: location.settled?.reason ?? '' },
    resolver: formResolver<Fields, typeof settleBody>(settleBody),
  });
  const { errors, isSubmitting, isDirty } = formState;
  const countries = useMemo(() => {
    const known = [location.declared, location.billing, location.card].filter((code) => code !== null);
    const all = countryOptions(session?.workshop.locale ?? 'en-GB', {
      languages: [],
      workshopCountry: undefined,
    });
    // What the evidence names comes first.
    const first = [...new Set(known)].flatMap((code) => all.find(({ value }) => value === code) ?? []);
    return [...first, ...all.filter((one) => !first.includes(one))];
  }, [session, location]);
  const save = handleSubmit(async (body) => {
    const outcome = await run({ params: { receiptId: location.receiptId }, body });
    setIsSaved(outcome.isDone);
    if (!outcome.isDone) showFieldFaults(outcome.fault, ['country', 'reason'], setError);
  });
  return (
    <Form onSubmit={save}>
      <SelectField
        label={texts.country}
        emptyLabel={texts.countryEmpty}
        options={countries}
        error={errors.country}
        {...register('country')}
      />
      <TextArea
        label={texts.reason}
        hint={texts.reasonHint}
        rows={3}
        maxLength={500}
        error={errors.reason}
        {...register('reason')}
      />
      {fault && <Fault what={texts.failed} fault={fault} />}
      <Box display="flex" alignItems="center" gap="4">
        <Button type="submit" isBusy={isSubmitting} busyWords={texts.saving}>
          {texts.save}
        </Button>
        <Box role="status" fontSize="sm" color="ink.soft">
          {isSaved && !isDirty ? texts.saved : ''}
        </Box>
      </Box>
    </Form>
  );
}
