import { Box } from '@chakra-ui/react/box';
import { rateBody } from '@windchest/contracts';
import { useMemo, useState } from 'react';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { ratesTexts as texts } from '../../config/texts/workshop-tax.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { countryOptions } from '../basket/country-options.js';
import { rateAnswers } from './rate-answers.js';

type Fields = z.input<typeof rateBody>;
const names = ['country', 'ratePercent', 'validFrom', 'source'] as const;
const formId = 'enter-rate';

/** A rate from a day on; the same day again puts a slip of the pen right. */
export function EnterRate() {
  const { session } = useSession();
  const [isOpen, setIsOpen] = useState(false);
  const { run, fault, isRunning, reset } = useAction('POST /workshop/ledger/rates', rateAnswers);
  const form = useForm<Fields, unknown, z.output<typeof rateBody>>({
    defaultValues: { country: '', ratePercent: '', validFrom: '', source: '' },
    resolver: formResolver<Fields, typeof rateBody>(rateBody),
  });
  const { register, handleSubmit, setError, formState } = form;
  const { errors } = formState;
  const countries = useMemo(
    () =>
      countryOptions(session?.workshop.locale ?? 'en-GB', {
        languages: [],
        workshopCountry: session?.workshop.country,
      }),
    [session],
  );
  const close = () => {
    setIsOpen(false);
    reset();
    form.reset();
  };
  const enter = handleSubmit(async (body) => {
    const outcome = await run({ body });
    if (outcome.isDone) close();
    else showFieldFaults(outcome.fault, names, setError);
  });
  return (
    <>
      <Button onClick={() => setIsOpen(true)}>{texts.enter}</Button>
      <Dialog
        isOpen={isOpen}
        onClose={close}
        title={texts.dialogTitle}
        actions={
          <>
            <Button type="submit" form={formId} isBusy={isRunning} busyWords={texts.saving}>
              {texts.save}
            </Button>
            <Button look="outline" onClick={close}>
              {texts.cancel}
            </Button>
          </>
        }
      >
        <Form id={formId} onSubmit={enter}>
          <SelectField
            label={texts.country}
            emptyLabel={texts.countryEmpty}
            options={countries}
            error={errors.country}
            {...register('country')}
          />
          <Box
            display="grid"
            gap="3"
            gridTemplateColumns="minmax(0, 1fr) minmax(0, 1.4fr)"
            alignItems="start"
          >
            <TextField
              label={texts.rate}
              inputMode="decimal"
              placeholder="21"
              error={errors.ratePercent}
              {...register('ratePercent')}
            />
            <TextField
              label={texts.validFrom}
              type="date"
              error={errors.validFrom}
              {...register('validFrom')}
            />
          </Box>
          <Box fontSize="sm" color="ink.soft" lineHeight="snug">
            {texts.validFromHint}
          </Box>
          <TextField
            label={texts.source}
            hint={texts.sourceHint}
            maxLength={200}
            error={errors.source}
            {...register('source')}
          />
          {fault && <Fault what={texts.failed} fault={fault} />}
        </Form>
      </Dialog>
    </>
  );
}
