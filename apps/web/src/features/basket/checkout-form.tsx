import { checkoutBody, consentText, type Quote } from '@windchest/contracts';
import { useEffect, useMemo, useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { basketTexts } from '../../config/texts/basket.js';
import { ApiFault } from '../../lib/api-fault.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useSession } from '../../lib/session.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { CheckoutFault } from './checkout-fault.js';
import { countryOptions } from './country-options.js';
import { useCheckout } from './use-checkout.js';

interface Fields {
  email: string;
  country: string;
  hasConsented: boolean;
}

const names = ['email', 'country', 'hasConsented'] as const;
const schema = checkoutBody.pick({ email: true, hasConsented: true }).extend({
  country: z.string().regex(/^[A-Z]{2}$/, basketTexts.countryMissing),
});

export interface CheckoutFormProps {
  /** For the button, which stands in the title block. */
  id: string;
  quote: Quote;
  /** The price on the page is that of the basket. */
  isCurrent: boolean;
  requote: () => void;
  /** Whether the button may be pressed yet, and whether the payment page is being opened. */
  onState: (state: { isReady: boolean; isOpening: boolean }) => void;
}

/** Who buys, and from where. What was typed stays, whatever the answer. */
export function CheckoutForm({ id, quote, isCurrent, requote, onState }: CheckoutFormProps) {
  const { session, person } = useSession();
  const { run, isOpening } = useCheckout();
  const [fault, setFault] = useState<ApiFault>();
  const { register, handleSubmit, setError, formState } = useForm<Fields, unknown, z.output<typeof schema>>({
    defaultValues: { email: person?.email ?? '', country: '', hasConsented: false },
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
  useEffect(() => onState({ isReady: true, isOpening }), [onState, isOpening]);

  const pay = handleSubmit(async ({ email, country }) => {
    if (isOpening || !isCurrent || quote.lines.length === 0) return;
    setFault(undefined);
    const refused = await run({
      licenceIds: quote.lines.map((line) => line.licenceId),
      couponCode: quote.coupon?.code,
      email,
      country,
    });
    if (!refused || showFieldFaults(refused, names, setError)) return;
    setFault(refused);
    if (refused.code.startsWith('coupon-') || refused.code === 'basket-has-gone') requote();
  });

  return (
    <Form id={id} onSubmit={pay} aria-label={basketTexts.checkout}>
      <TextField
        label={basketTexts.email}
        hint={basketTexts.emailHint}
        type="email"
        autoComplete="email"
        error={errors.email}
        {...register('email')}
      />
      <SelectField
        label={basketTexts.country}
        hint={basketTexts.countryHint}
        emptyLabel={basketTexts.countryEmpty}
        options={countries}
        autoComplete="country"
        error={errors.country}
        {...register('country')}
      />
      <Checkbox label={consentText} error={errors.hasConsented} {...register('hasConsented')} />
      {fault && <CheckoutFault fault={fault} onAgain={() => void pay()} />}
    </Form>
  );
}
