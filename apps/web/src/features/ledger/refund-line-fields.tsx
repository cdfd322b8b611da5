import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import type { FieldError, UseFormRegister } from 'react-hook-form';
import { refundTexts as texts } from '../../config/texts/workshop-refunds.js';
import { readAmount } from '../../lib/amount-text.js';
import { price } from '../../lib/format.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { TextField } from '../../ui/field/text-field.js';
import { Text } from '../../ui/text.js';
import { leftOf, type RefundForm } from './refund-form.js';

export interface RefundLineFieldsProps {
  order: WorkshopOrder;
  line: WorkshopOrder['lines'][number];
  at: number;
  register: UseFormRegister<RefundForm>;
  error: FieldError | undefined;
  onTyped: () => void;
}

/** How much of one line goes back, and whether the right to its files stays. */
export function RefundLineFields({ order, line, at, register, error, onTyped }: RefundLineFieldsProps) {
  const { currency } = line.total;
  const left = leftOf(order, line);
  const paid = price(line.total);
  const name = texts.amountOf(line.kitName, line.revision);
  const check = (text: string): true | string => {
    if (text.trim() === '') return true;
    const read = readAmount(text, currency);
    if ('fault' in read) return read.fault;
    if (read.minor < 0) return texts.belowZero;
    return read.minor <= left || texts.tooMuch(price({ minor: left, currency }));
  };
  if (left === 0)
    return (
      <Box paddingBlock="3" borderTopWidth="1px" borderColor="hairline">
        <Text fontWeight="semibold">{name}</Text>
        <Text look="small" isSoft>
          {texts.nothingLeft(line.total.minor > 0 ? paid : '')}
        </Text>
      </Box>
    );
  return (
    <Box
      paddingBlock="3"
      borderTopWidth="1px"
      borderColor="hairline"
      display="grid"
      gap="2.5"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: '11rem minmax(0, 1fr)' }}
      columnGap="6"
      alignItems="start"
    >
      <TextField
        label={name}
        hint={texts.left(price({ minor: left, currency }), paid)}
        inputMode="decimal"
        placeholder={currency}
        error={error}
        {...register(`lines.${at}.amount`, { validate: check, onChange: onTyped })}
      />
      {(line.right === 'active' || line.right === 'suspended') && (
        <Box paddingTop={{ sm: '3.4rem' }}>
          <Checkbox label={texts.keeps(line.kitName)} {...register(`lines.${at}.keepsEntitlement`)} />
        </Box>
      )}
    </Box>
  );
}
