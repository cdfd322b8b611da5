import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { type Coupon, couponBody } from '@windchest/contracts';
import { type ReactNode, useState } from 'react';
import { useForm } from 'react-hook-form';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { couponFormTexts as texts } from '../../config/texts/workshop-coupons.js';
import { readAmount } from '../../lib/amount-text.js';
import type { ApiFault } from '../../lib/api-fault.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import type { Outcome } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { NumberField } from '../../ui/field/number-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { couponBodyOf, type CouponForm, couponForm } from './coupon-form.js';
import { zoneName } from './local-moment.js';
import { OffFields } from './off-fields.js';

const Group = chakra('fieldset', { base: { border: '0', padding: '0', margin: '0', minWidth: '0' } });
const Legend = ({ title, hint }: { title: string; hint?: string }) => (
  <>
    <Box as="legend" fontSize="sm" fontWeight="semibold">
      {title}
    </Box>
    {hint && (
      <Box fontSize="sm" color="ink.soft" lineHeight="snug" marginBottom="2">
        {hint}
      </Box>
    )}
  </>
);
const Pair = ({ children }: { children: ReactNode }) => (
  <Box
    display="grid"
    gap="3"
    alignItems="start"
    gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}
  >
    {children}
  </Box>
);

/** `off` is several fields; its sentence stands above the button. */
const fieldNames = [
  'code',
  'label',
  'cap',
  'perBuyer',
  'minBasketMinor',
  'endsAt',
  'startsAt',
  'isAnnounced',
] as const;

export interface CouponFieldsProps {
  /** Null makes a new one. */
  coupon: Coupon | null;
  currency: string;
  isWritable: boolean;
  save: (body: CouponBody) => Promise<Outcome<Coupon>>;
  fault: ApiFault | undefined;
}
export type CouponBody = ReturnType<typeof couponBody.parse>;

/** All of a coupon in one form. */
export function CouponFields({ coupon, currency, isWritable, save, fault }: CouponFieldsProps) {
  const { data: kits } = useEndpoint('GET /workshop/kits', { query: { size: 100 } });
  const [isFaultBesideField, setIsFaultBesideField] = useState(false);
  const form = useForm({
    defaultValues: couponForm(coupon, currency),
    resolver: formResolver<CouponForm, typeof couponBody>(couponBody, couponBodyOf(currency)),
  });
  const { register, handleSubmit, setError, formState } = form;
  const { errors, isSubmitting, isDirty } = formState;
  const [isSaved, setIsSaved] = useState(false);
  const minBasketFault = (sentence: string | undefined) => {
    const read = readAmount(form.getValues('minBasketMinor'), currency);
    return 'fault' in read ? read.fault : sentence;
  };
  const submit = handleSubmit(async (body) => {
    const outcome = await save(body);
    setIsSaved(outcome.isDone);
    if (outcome.isDone) form.reset(couponForm(outcome.data, currency));
    else setIsFaultBesideField(showFieldFaults(outcome.fault, fieldNames, setError));
  });
  return (
    <Form onSubmit={submit} gap="6">
      <Group disabled={!isWritable} display="grid" gap="6">
        <Pair>
          <TextField label={texts.code} hint={texts.codeHint} error={errors.code} {...register('code')} />
          <TextField label={texts.label} hint={texts.labelHint} error={errors.label} {...register('label')} />
        </Pair>
        <OffFields form={form as never} error={errors.off as never} currency={currency} />
        <Group>
          <Legend title={texts.kits} hint={texts.kitsHint} />
          <Box display="flex" flexWrap="wrap" columnGap="6" rowGap="1.5">
            {kits?.items.map((kit) => (
              <Checkbox key={kit.id} label={kit.name} value={kit.id} {...register('kitIds')} />
            ))}
          </Box>
        </Group>
        <Group>
          <Legend title={texts.window} hint={texts.zone(zoneName())} />
          <Pair>
            <TextField
              label={texts.startsAt}
              type="datetime-local"
              error={errors.startsAt}
              {...register('startsAt')}
            />
            <TextField
              label={texts.endsAt}
              type="datetime-local"
              error={errors.endsAt}
              {...register('endsAt')}
            />
          </Pair>
        </Group>
        <Pair>
          <NumberField
            label={texts.cap}
            hint={texts.capHint}
            step={1}
            error={errors.cap}
            {...register('cap', { valueAsNumber: true })}
          />
          <NumberField
            label={texts.perBuyer}
            hint={texts.perBuyerHint}
            step={1}
            error={errors.perBuyer}
            {...register('perBuyer', { valueAsNumber: true })}
          />
        </Pair>
        <Pair>
          <TextField
            label={texts.minBasket(currency)}
            hint={texts.minBasketHint}
            inputMode="decimal"
            error={errors.minBasketMinor && minBasketFault(errors.minBasketMinor.message)}
            {...register('minBasketMinor')}
          />
        </Pair>
        <Checkbox
          label={texts.isForSupporters}
          hint={texts.isForSupportersHint}
          {...register('isForSupporters')}
        />
        <Checkbox
          label={texts.isAnnounced}
          hint={texts.isAnnouncedHint}
          error={errors.isAnnounced}
          {...register('isAnnounced')}
        />
        <Checkbox label={texts.isActive} hint={texts.isActiveHint} {...register('isActive')} />
      </Group>
      {fault && !isFaultBesideField && <Fault what={texts.failed} fault={fault} />}
      {isWritable && (
        <Box display="flex" alignItems="center" gap="4">
          <Button type="submit" isBusy={isSubmitting} busyWords={savingTexts.saving}>
            {coupon ? texts.save : texts.make}
          </Button>
          <Box role="status" fontSize="sm" color="ink.soft">
            {isSaved && !isDirty ? savingTexts.saved : ''}
          </Box>
        </Box>
      )}
    </Form>
  );
}
