import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import { basketTexts } from '../../config/texts/basket.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { TextArea, TextField } from '../../ui/field/text-field.js';
import { Text } from '../../ui/text.js';
import type { CheckoutFields } from './checkout-fields.js';
import { WishFields } from './wish-fields.js';

export interface GiftFieldsProps {
  register: UseFormRegister<CheckoutFields>;
  errors: FieldErrors<CheckoutFields>;
  isGift: boolean;
}

/** The whole basket for somebody else: to whom, from whom, and a line to go with it. */
export const GiftFields = ({ register, errors, isGift }: GiftFieldsProps) => (
  <WishFields
    isOpen={isGift}
    label={basketTexts.giftLabel}
    box={<Checkbox label={basketTexts.isGift} {...register('isGift')} />}
  >
    <Text look="small" isSoft>
      {basketTexts.giftWhat}
    </Text>
    <TextField
      label={basketTexts.giftEmail}
      type="email"
      autoComplete="off"
      error={errors.gift?.email}
      {...register('gift.email')}
    />
    <TextField
      label={basketTexts.giver}
      hint={basketTexts.giverHint}
      autoComplete="name"
      maxLength={80}
      error={errors.gift?.giver}
      {...register('gift.giver')}
    />
    <TextArea
      label={basketTexts.greeting}
      rows={2}
      maxLength={300}
      error={errors.gift?.greeting}
      {...register('gift.greeting')}
    />
  </WishFields>
);
