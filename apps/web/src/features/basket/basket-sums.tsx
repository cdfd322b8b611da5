import { Box } from '@chakra-ui/react/box';
import type { Quote } from '@windchest/contracts';
import { basketTexts } from '../../config/texts/basket.js';
import { priceTexts } from '../../config/texts/shared.js';
import { price } from '../../lib/format.js';
import { countryName } from '../../lib/workshop-format.js';
import { Text } from '../../ui/text.js';

interface SumProps {
  name: string;
  value: string;
  isMain?: boolean;
}

const Sum = ({ name, value, isMain }: SumProps) => (
  <Box
    display="flex"
    justifyContent="space-between"
    gap="6"
    paddingBlock="1.5"
    fontWeight={isMain ? 'bold' : undefined}
    fontSize={isMain ? 'lg' : undefined}
    borderTopWidth={isMain ? '1px' : undefined}
    borderColor="ink"
    color={isMain ? 'ink' : 'ink.soft'}
  >
    <dt>{name}</dt>
    <Box as="dd" whiteSpace="nowrap">
      {value}
    </Box>
  </Box>
);

/** What of the total is tax, and why there is none where there is none. */
function taxWords({ tax }: Quote): string {
  if (!tax) return basketTexts.taxNote;
  const country = countryName(tax.country);
  if (tax.treatment === 'reverse-charge') return basketTexts.reverseCharge(country);
  if (tax.treatment === 'business-abroad') return basketTexts.businessAbroad;
  return tax.ratePercent === null || tax.tax.minor === 0
    ? basketTexts.noTax(country)
    : basketTexts.taxWithin(tax.ratePercent, price(tax.tax), country);
}

/** What the basket comes to; faint while a new price is on its way. */
export function BasketSums({ quote, isCurrent }: { quote: Quote; isCurrent: boolean }) {
  const { subtotal, discount, total, coupon } = quote;
  return (
    <Box
      aria-busy={!isCurrent}
      marginLeft="auto"
      maxWidth={{ md: '22rem' }}
      opacity={isCurrent ? 1 : 0.55}
      transition="opacity"
      transitionDuration="fast"
    >
      <dl>
        {coupon && (
          <>
            <Sum name={basketTexts.subtotal} value={price(subtotal)} />
            <Sum
              name={basketTexts.discount(coupon.code)}
              value={price({ ...discount, minor: -discount.minor })}
            />
          </>
        )}
        <Sum name={basketTexts.total} value={total.minor === 0 ? priceTexts.free : price(total)} isMain />
      </dl>
      <Text look="small" isSoft textAlign="end">
        {taxWords(quote)}
      </Text>
    </Box>
  );
}
