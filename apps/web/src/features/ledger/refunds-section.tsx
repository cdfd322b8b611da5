import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder, WorkshopRefund } from '@windchest/contracts';
import { useState } from 'react';
import { refundTexts as texts } from '../../config/texts/workshop-refunds.js';
import { apiAddress } from '../../lib/api-address.js';
import { dateTime, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { Button } from '../../ui/button.js';
import { TextAnchor } from '../../ui/link.js';
import type { SignName } from '../../ui/sign.js';
import { StatusMark } from '../../ui/status-mark.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Unbroken } from '../../ui/unbroken.js';
import { DecideRights } from './decide-rights.js';

const signs: Record<WorkshopRefund['state'], SignName> = {
  asked: 'wait',
  succeeded: 'ok',
  failed: 'stop',
  returned: 'warn',
};

const Soft = ({ children }: { children: string }) =>
  children && (
    <Box fontSize="sm" lineHeight="snug" color="ink.soft">
      {children}
    </Box>
  );

/** What failed ended nothing; what waits has not yet. */
function rightWords({ state }: WorkshopRefund, isKept: boolean): string {
  if (state === 'failed') return '';
  if (isKept) return texts.keptRight;
  return state === 'asked' ? texts.endingRight : texts.endedRight;
}

const Lines = ({ order, refund }: { order: WorkshopOrder; refund: WorkshopRefund }) =>
  refund.lines.map((line) => (
    <Box key={line.orderLineId}>
      {texts.lineOf(
        order.lines.find((one) => one.id === line.orderLineId)?.kitName ?? '',
        line.amount.minor > 0 ? price(line.amount) : '',
      )}
      <Soft>{rightWords(refund, line.keepsEntitlement)}</Soft>
    </Box>
  ));

const columnsOf = (order: WorkshopOrder): Column<WorkshopRefund>[] => [
  {
    key: 'amount',
    header: texts.columns.amount,
    isHeading: true,
    cell: (refund) => (
      <Box>
        <Box fontWeight="semibold">
          <Unbroken>{price(refund.amount)}</Unbroken>
        </Box>
        <Soft>{dateTime(refund.at)}</Soft>
      </Box>
    ),
  },
  {
    key: 'state',
    header: texts.columns.state,
    cell: (refund) => (
      <Box>
        <StatusMark state={signs[refund.state]}>{texts.states[refund.state]}</StatusMark>
        <Soft>{texts.origins[refund.origin](refund.askedBy)}</Soft>
        <Soft>{refund.origin === 'workshop' ? refund.reason : ''}</Soft>
        <Soft>{refund.fault ?? ''}</Soft>
      </Box>
    ),
  },
  {
    key: 'lines',
    header: texts.columns.lines,
    cell: (refund) => (
      <Box>
        <Lines order={order} refund={refund} />
      </Box>
    ),
  },
  {
    key: 'papers',
    header: texts.columns.papers,
    cell: ({ creditNote }) =>
      creditNote ? (
        <TextAnchor
          whiteSpace="nowrap"
          href={apiAddress('GET /workshop/orders/:orderId/credit-notes/:creditNoteId.pdf', {
            params: { orderId: order.id, creditNoteId: creditNote.id },
          })}
        >
          {creditNote.number}
        </TextAnchor>
      ) : (
        texts.noPaper
      ),
  },
];

/** What was asked for, what went back and what failed; and which rights end with it. */
export function RefundsSection({ order }: { order: WorkshopOrder }) {
  const { may } = useSession();
  const [decided, setDecided] = useState<WorkshopRefund>();
  const canDecide = (refund: WorkshopRefund) =>
    may('orders:refund') &&
    refund.origin !== 'dispute' &&
    refund.lines.length > 0 &&
    (refund.state === 'succeeded' || refund.state === 'returned');
  return (
    <>
      <HairlineTable
        caption={texts.caption}
        columns={[
          ...columnsOf(order),
          {
            key: 'decide',
            header: '',
            cell: (refund) =>
              canDecide(refund) && (
                <Button look="plain" size="sm" whiteSpace="nowrap" onClick={() => setDecided(refund)}>
                  {texts.decide}
                </Button>
              ),
          },
        ]}
        rows={order.refunds}
        rowKey={(refund) => refund.id}
      />
      {decided && <DecideRights order={order} refund={decided} onClose={() => setDecided(undefined)} />}
    </>
  );
}
