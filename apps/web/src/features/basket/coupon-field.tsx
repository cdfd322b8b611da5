import { Box } from '@chakra-ui/react/box';
import type { Quote } from '@windchest/contracts';
import { type FormEvent, useEffect, useRef, useState } from 'react';
import { basketTexts } from '../../config/texts/basket.js';
import { number, price } from '../../lib/format.js';
import { Button } from '../../ui/button.js';
import { TextField } from '../../ui/field/text-field.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Text } from '../../ui/text.js';
import { couponCode, isCode, tidyCode } from './coupon-code.js';

type Coupon = NonNullable<Quote['coupon']>;

const placesWords = ({ cap, left }: Coupon) =>
  cap === null || left === null ? '' : basketTexts.left(number(left), number(cap));

const Applied = ({ coupon, discount }: { coupon: Coupon; discount: Quote['discount'] }) => (
  <Box role="status">
    <StatusMark state="ok">
      {coupon.code} {basketTexts.takesOff(price(discount))}
    </StatusMark>
    <Text look="small" isSoft>
      {[coupon.label, placesWords(coupon)].filter(Boolean).join(' · ')}
    </Text>
  </Box>
);

export interface CouponFieldProps {
  quote: Quote;
  /** The code asked with. */
  code: string;
}

/** One code for the basket: written, used, left out again; why it does not hold in its own words. */
export function CouponField({ quote, code }: CouponFieldProps) {
  const [text, setText] = useState(code);
  const [slip, setSlip] = useState<string>();
  const [isJustLeftOut, setIsJustLeftOut] = useState(false);
  const input = useRef<HTMLInputElement>(null);
  const applied = quote.coupon && quote.coupon.code === code ? quote.coupon : undefined;
  useEffect(() => {
    if (isJustLeftOut && !applied) input.current?.focus();
  }, [isJustLeftOut, applied]);

  const use = (event: FormEvent) => {
    event.preventDefault();
    const tidy = tidyCode(text);
    setText(tidy);
    if (!isCode(tidy)) {
      setSlip(tidy ? basketTexts.codeRefused : basketTexts.codeEmpty);
      input.current?.focus();
      return;
    }
    setSlip(undefined);
    couponCode.set(tidy);
  };
  const leaveOut = () => {
    couponCode.set('');
    setText('');
    setIsJustLeftOut(true);
  };

  if (applied)
    return (
      <Box>
        <Applied coupon={applied} discount={quote.discount} />
        <Button look="plain" size="sm" onClick={leaveOut}>
          {basketTexts.leaveOut}
        </Button>
      </Box>
    );
  const refusal = tidyCode(text) === code ? quote.couponFault?.detail : undefined;
  return (
    <Box as="form" onSubmit={use} display="flex" alignItems="flex-start" gap="2" maxWidth="narrow">
      <Box flex="1" minWidth="0" role={refusal ? 'alert' : undefined}>
        <TextField
          label={basketTexts.code}
          ref={input}
          value={text}
          maxLength={40}
          autoComplete="off"
          autoCapitalize="characters"
          spellCheck={false}
          error={slip ?? refusal}
          onChange={(event) => {
            setText(event.target.value);
            setSlip(undefined);
          }}
        />
      </Box>
      {/* In line with the field, below its label. */}
      <Button type="submit" look="outline" marginTop="calc(0.875rem * 1.3 + 0.375rem)" whiteSpace="nowrap">
        {basketTexts.use}
      </Button>
    </Box>
  );
}
