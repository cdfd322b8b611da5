import { Box } from '@chakra-ui/react/box';
import type { FieldError, UseFormReturn } from 'react-hook-form';
import { couponFormTexts as texts } from '../../config/texts/workshop-coupons.js';
import { readAmount } from '../../lib/amount-text.js';
import { NumberField } from '../../ui/field/number-field.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';
import { TextField } from '../../ui/field/text-field.js';
import type { CouponForm } from './coupon-form.js';
import type { OffKind } from './off-form.js';

const kinds = Object.keys(texts.kinds) as OffKind[];

export interface OffFieldsProps {
  form: Pick<UseFormReturn<CouponForm, unknown, never>, 'register' | 'watch' | 'getValues'>;
  error: (Partial<Record<string, FieldError>> & { message?: string }) | undefined;
  currency: string;
}

/** What the coupon takes off: a percentage, an exact fraction, or an amount. */
export function OffFields({ form, error, currency }: OffFieldsProps) {
  const { register, watch, getValues } = form;
  const kind = watch('off.kind');
  const amountFault = () => {
    if (!error) return undefined;
    const read = readAmount(getValues('off.amount'), currency);
    return 'fault' in read ? read.fault : (error['minor']?.message ?? error.message);
  };
  return (
    <Box display="grid" gap="3">
      <RadioRows legend={texts.off}>
        {kinds.map((one) => (
          <RadioRow key={one} value={one} label={texts.kinds[one]} {...register('off.kind')} />
        ))}
      </RadioRows>
      {kind === 'percent' && (
        <Box maxWidth="11rem">
          <NumberField
            label={texts.percent}
            unit="%"
            error={error && texts.percentFault}
            {...register('off.percent', { valueAsNumber: true })}
          />
        </Box>
      )}
      {kind === 'fraction' && (
        <Box display="grid" gap="3" gridTemplateColumns="repeat(2, minmax(0, 8rem))" alignItems="start">
          <NumberField
            label={texts.numerator}
            step={1}
            error={error && texts.fractionFault}
            {...register('off.numerator', { valueAsNumber: true })}
          />
          <NumberField
            label={texts.denominator}
            step={1}
            {...register('off.denominator', { valueAsNumber: true })}
          />
        </Box>
      )}
      {kind === 'amount' && (
        <Box maxWidth="18rem">
          <TextField
            label={texts.amount(currency)}
            hint={texts.amountHint}
            inputMode="decimal"
            error={amountFault()}
            {...register('off.amount')}
          />
        </Box>
      )}
    </Box>
  );
}
