import { Box } from '@chakra-ui/react/box';
import type { OutputOf, PledgePayment } from '@windchest/contracts';
import { ownPledgeTexts as texts } from '../../config/texts/pledge.js';
import type { ApiFault } from '../../lib/api-fault.js';
import { date, price } from '../../lib/format.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Pager } from '../../ui/table/pager.js';
import { Text } from '../../ui/text.js';
import { Unbroken } from '../../ui/unbroken.js';

const columns: readonly Column<PledgePayment>[] = [
  {
    key: 'paid',
    header: texts.columns.paid,
    isHeading: true,
    cell: (one) => <Unbroken>{date(one.paidAt)}</Unbroken>,
  },
  { key: 'plan', header: texts.columns.plan, cell: (one) => one.planName },
  {
    key: 'period',
    header: texts.columns.period,
    cell: (one) => texts.period(date(one.periodStart), date(one.periodEnd)),
  },
  {
    key: 'receipt',
    header: texts.columns.receipt,
    cell: (one) => <Unbroken>{one.receiptNumber ?? texts.none4}</Unbroken>,
  },
  {
    key: 'amount',
    header: texts.columns.amount,
    isNumeric: true,
    cell: (one) => (
      <Box lineHeight="1.4">
        <Unbroken>{price(one.amount)}</Unbroken>
        {one.tax
          .filter(({ tax }) => tax.minor > 0)
          .map(({ ratePercent, tax }) => (
            <Box key={ratePercent} fontSize="sm" color="ink.soft" fontWeight="normal">
              {texts.taxOf(ratePercent, price(tax))}
            </Box>
          ))}
      </Box>
    ),
  },
];

export interface PledgePaymentsProps {
  answer: OutputOf<'GET /pledges/:pledgeId/payments'> | undefined;
  fault: ApiFault | undefined;
  onAgain: () => void;
  addressOf: (change: { page: number }) => string;
}

/** The months that were paid, with their receipts. */
export const PledgePayments = ({ answer, fault, onAgain, addressOf }: PledgePaymentsProps) =>
  fault && !answer ? (
    <Fault level={3} what={texts.paymentsFailed} fault={fault} onAgain={onAgain} />
  ) : !answer ? (
    <SkeletonLines lines={3} />
  ) : answer.total === 0 ? (
    <Text isSoft>{texts.noPayments}</Text>
  ) : (
    <>
      <HairlineTable
        caption={texts.payments}
        columns={columns}
        rows={answer.items}
        rowKey={(one) => one.id}
      />
      <Pager page={answer.page} size={answer.size} total={answer.total} addressOf={addressOf} />
    </>
  );
