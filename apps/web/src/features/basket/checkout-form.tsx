import { consentText, type Quote } from '@windchest/contracts';
import { useEffect, useMemo, useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import type { z } from 'zod';
import { basketTexts } from '../../config/texts/basket.js';
import { ApiFault } from '../../lib/api-fault.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useSession } from '../../lib/session.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { BusinessFields } from './business-fields.js';
import {
  checkoutFieldNames,
  type CheckoutFields,
  checkoutSchema,
  emptyCheckout,
  toCheckout,
} from './checkout-fields.js';
import { CheckoutFault } from './checkout-fault.js';
import { countryOptions } from './country-options.js';
import { GiftFields } from './gift-fields.js';
import { useCheckout } from './use-checkout.js';
import type { TaxedBuyer } from './use-quote.js';

export interface BasketWishes extends TaxedBuyer {
  isGift: boolean;
}

export interface CheckoutFormProps {
  /** For the button, which stands in the title block. */
  id: string;
  quote: Quote;
  /** The price on the page is that of the basket. */
  isCurrent: boolean;
  requote: () => void;
  /** What the price depends on, as soon as it is typed. */
  onWishes: (wishes: BasketWishes) => void;
  /** Whether the button may be pressed yet, and whether the payment page is being opened. */
  onState: (state: { isReady: boolean; isOpening: boolean }) => void;
}

/** Who buys, and from where. What was typed stays, whatever the answer. */
export function CheckoutForm({ id, quote, isCurrent, requote, onWishes, onState }: CheckoutFormProps) {
  const { session, person } = useSession();
  const { run, isOpening } = useCheckout();
  const [fault, setFault] = useState<ApiFault>();
  const { register, handleSubmit, setError, control, formState } = useForm<
    CheckoutFields,
    unknown,
    z.output<typeof checkoutSchema>
  >({
    defaultValues: emptyCheckout(person?.email ?? '', person?.name ?? ''),
    resolver: formResolver<CheckoutFields, typeof checkoutSchema>(checkoutSchema, toCheckout),
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
  const [country, isBusiness, isGift, typedNumber] = useWatch({
    control,
    name: ['country', 'isBusiness', 'isGift', 'business.vatNumber'],
  });
  const vatNumber = isBusiness ? typedNumber : null;
  useEffect(() => onWishes({ country, vatNumber, isGift }), [onWishes, country, vatNumber, isGift]);
  useEffect(() => onState({ isReady: true, isOpening }), [onState, isOpening]);

  const pay = handleSubmit(async ({ email, country, business, gift }) => {
    if (isOpening || !isCurrent || quote.lines.length === 0) return;
    setFault(undefined);
    const refused = await run({
      licenceIds: quote.lines.map((line) => line.licenceId),
      couponCode: quote.coupon?.code,
      email,
      country,
      business,
      gift,
    });
    if (!refused || showFieldFaults(refused, checkoutFieldNames, setError)) return;
    setFault(refused);
    if (refused.code.startsWith('coupon-') || refused.code === 'basket-has-gone') requote();
  });

  return (
    <Form id={id} onSubmit={pay} aria-label={basketTexts.checkout}>
      <TextField
        label={basketTexts.email}
        hint={isGift ? basketTexts.emailHintOfGift : basketTexts.emailHint}
        type="email"
        autoComplete="email"
        error={errors.email}
        {...register('email')}
      />
      <SelectField
        label={basketTexts.country}
        hint={isBusiness ? basketTexts.countryHintOfBusiness : basketTexts.countryHint}
        emptyLabel={basketTexts.countryEmpty}
        options={countries}
        autoComplete="country"
        error={errors.country}
        {...register('country')}
      />
      <BusinessFields register={register} errors={errors} isBusiness={isBusiness} />
      <GiftFields register={register} errors={errors} isGift={isGift} />
      <Checkbox label={consentText} error={errors.hasConsented} {...register('hasConsented')} />
      {fault && <CheckoutFault fault={fault} onAgain={() => void pay()} />}
    </Form>
  );
}
