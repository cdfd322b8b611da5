import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { orderTexts } from '../../config/texts/order.js';
import { priceTexts } from '../../config/texts/shared.js';
import { price } from '../../lib/format.js';
import { FilamentSwatch } from '../../ui/drawing/filament-swatch.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { Unbroken } from '../../ui/unbroken.js';

type Line = BuyerOrder['lines'][number];
type Amount = Line['total'];

const orFree = (amount: Amount) => (
  <Unbroken>{amount.minor === 0 ? priceTexts.free : price(amount)}</Unbroken>
);
const less = (amount: Amount) =>
  amount.minor === 0 ? '' : <Unbroken>{price({ ...amount, minor: -amount.minor })}</Unbroken>;

const kitColumn: Column<Line> = {
  key: 'kit',
  header: orderTexts.kit,
  isHeading: true,
  cell: (line) => (
    <KitColour palette={line.colour} display="flex" gap="3" minWidth="0">
      <FilamentSwatch alignSelf="stretch" />
      <Box minWidth="0">
        <Box fontWeight="semibold">
          {line.kitName} {line.revision}
        </Box>
        <Box fontSize="sm" fontWeight="normal" color="ink.soft">
          {line.licenceName}
        </Box>
        {(line.right === 'ended' || line.right === 'suspended') && (
          <Box fontSize="sm" fontWeight="normal" color="ink.soft">
            {line.right === 'ended' ? orderTexts.rightEnded : orderTexts.rightSuspended}
          </Box>
        )}
      </Box>
    </KitColour>
  ),
};
const totalColumn: Column<Line> = {
  key: 'total',
  header: orderTexts.total,
  isNumeric: true,
  cell: (line) => orFree(line.total),
};
const discountColumns: readonly Column<Line>[] = [
  {
    key: 'price',
    header: orderTexts.price,
    isNumeric: true,
    cell: (line) => <Unbroken>{price(line.price)}</Unbroken>,
  },
  { key: 'discount', header: orderTexts.discount, isNumeric: true, cell: (line) => less(line.discount) },
];

const Sum = ({ name, isMain, children }: { name: string; isMain?: boolean; children: ReactNode }) => (
  <Box
    display="flex"
    justifyContent="space-between"
    gap="6"
    paddingBlock="1.5"
    paddingInline={{ md: '2.5' }}
    fontWeight={isMain ? 'bold' : undefined}
    fontSize={isMain ? 'lg' : undefined}
    borderTopWidth={isMain ? '1px' : undefined}
    borderColor="ink"
    color={isMain ? 'ink' : 'ink.soft'}
  >
    <dt>{name}</dt>
    <Box as="dd" whiteSpace="nowrap">
      {children}
    </Box>
  </Box>
);

/** The lines of an order and what they come to. */
export function OrderLines({ order }: { order: BuyerOrder }) {
  const hasDiscount = order.discount.minor > 0;
  const taxes = order.tax.filter((line) => line.tax.minor > 0);
  return (
    <>
      <HairlineTable
        caption={orderTexts.lines}
        columns={hasDiscount ? [kitColumn, ...discountColumns, totalColumn] : [kitColumn, totalColumn]}
        rows={order.lines}
        rowKey={(line) => line.id}
      />
      <Box as="dl" marginTop="4" marginLeft="auto" maxWidth={{ md: '26rem' }}>
        {hasDiscount && (
          <>
            <Sum name={orderTexts.subtotal}>{price(order.subtotal)}</Sum>
            <Sum name={order.couponCode ? orderTexts.discountOf(order.couponCode) : orderTexts.discount}>
              {less(order.discount)}
            </Sum>
          </>
        )}
        <Sum name={orderTexts.total} isMain>
          {orFree(order.total)}
        </Sum>
        {taxes.map((line) => (
          <Sum key={line.ratePercent} name={orderTexts.taxOf(line.ratePercent, price(line.net))}>
            {price(line.tax)}
          </Sum>
        ))}
        {order.refunded.minor > 0 && <Sum name={orderTexts.refunded}>{less(order.refunded)}</Sum>}
      </Box>
      {taxes.length === 0 && order.total.minor > 0 && (
        <Box
          marginLeft="auto"
          maxWidth={{ md: '26rem' }}
          paddingInline={{ md: '2.5' }}
          fontSize="sm"
          color="ink.soft"
          textAlign="end"
        >
          {orderTexts.untaxed[order.taxTreatment]}
        </Box>
      )}
    </>
  );
}
