import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import { basketTexts } from '../../config/texts/basket.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { TextArea, TextField } from '../../ui/field/text-field.js';
import type { CheckoutFields } from './checkout-fields.js';
import { WishFields } from './wish-fields.js';

export interface BusinessFieldsProps {
  register: UseFormRegister<CheckoutFields>;
  errors: FieldErrors<CheckoutFields>;
  isBusiness: boolean;
}

/** Who buys for a business says so, and how the receipt should name it. */
export const BusinessFields = ({ register, errors, isBusiness }: BusinessFieldsProps) => (
  <WishFields
    isOpen={isBusiness}
    label={basketTexts.businessLabel}
    box={<Checkbox label={basketTexts.isBusiness} {...register('isBusiness')} />}
  >
    <TextField
      label={basketTexts.businessName}
      autoComplete="organization"
      maxLength={160}
      error={errors.business?.name}
      {...register('business.name')}
    />
    <TextArea
      label={basketTexts.businessAddress}
      rows={3}
      autoComplete="street-address"
      maxLength={400}
      error={errors.business?.address}
      {...register('business.address')}
    />
    <TextField
      label={basketTexts.vatNumber}
      hint={basketTexts.vatNumberHint}
      isOptional
      autoComplete="off"
      spellCheck={false}
      maxLength={30}
      error={errors.business?.vatNumber}
      {...register('business.vatNumber')}
    />
  </WishFields>
);
