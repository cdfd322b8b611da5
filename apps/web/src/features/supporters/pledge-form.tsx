import { pledgeConsentText, type Plan } from '@windchest/contracts';
import { useEffect, useMemo, useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { supportTexts as texts } from '../../config/texts/pledge.js';
import type { ApiFault } from '../../lib/api-fault.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useSession } from '../../lib/session.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { SelectField } from '../../ui/field/select-field.js';
import { Form } from '../../ui/form.js';
import { Text } from '../../ui/text.js';
import { countryOptions } from '../basket/country-options.js';
import { usePledging } from './use-pledging.js';

interface Fields {
  country: string;
  hasConsented: boolean;
}

const schema = z.object({
  country: z.string().regex(/^[A-Z]{2}$/, texts.countryMissing),
  hasConsented: z.literal(true, 'Tick the box: kits can only be handed over at once with your consent.'),
});

export interface PledgeFormProps {
  /** For the button, which stands in the title block. */
  id: string;
  plan: Plan;
  onOpening: (isOpening: boolean) => void;
}

/** From where somebody pledges, and their consent. */
export function PledgeForm({ id, plan, onOpening }: PledgeFormProps) {
  const { session } = useSession();
  const { run, isOpening } = usePledging();
  const [fault, setFault] = useState<ApiFault>();
  const { register, handleSubmit, setError, formState } = useForm<Fields, unknown, z.output<typeof schema>>({
    defaultValues: { country: '', hasConsented: false },
    resolver: formResolver<Fields, typeof schema>(schema),
  });
  const { errors } = formState;
  const countries = useMemo(
    () =>
      countryOptions(session?.workshop.locale ?? 'en-GB', {
        languages: navigator.languages,
        workshopCountry: session?.workshop.country,
      }),
    [session],
  );
  useEffect(() => onOpening(isOpening), [onOpening, isOpening]);
  const open = handleSubmit(async ({ country }) => {
    if (isOpening) return;
    setFault(undefined);
    const refused = await run({ planId: plan.id, country });
    if (refused && !showFieldFaults(refused, ['country', 'hasConsented'], setError)) setFault(refused);
  });

  return (
    <Form id={id} onSubmit={open} aria-label={texts.aside}>
      <SelectField
        label={texts.country}
        hint={texts.countryHint}
        emptyLabel={texts.countryEmpty}
        options={countries}
        autoComplete="country"
        error={errors.country}
        {...register('country')}
      />
      <Checkbox label={pledgeConsentText} error={errors.hasConsented} {...register('hasConsented')} />
      <Text look="small" isSoft>
        {texts.terms}
      </Text>
      {fault && <Fault level={3} what={texts.notOpened} fault={fault} onAgain={() => void open()} />}
    </Form>
  );
}
