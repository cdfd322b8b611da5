import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { orderStateTexts, orderTexts } from '../../config/texts/order.js';
import { ordersTexts, workshopOrderTexts as texts } from '../../config/texts/workshop-orders.js';
import { refundTexts } from '../../config/texts/workshop-refunds.js';
import { apiAddress } from '../../lib/api-address.js';
import { dateTime, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { AnchorButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { DisputesSection } from './disputes-section.js';
import { GiveMoneyBack } from './give-money-back.js';
import { OrderEvidence } from './order-evidence.js';
import { OrderFlagLines } from './order-flag-lines.js';
import { OrderHistory } from './order-history.js';
import { OrderLines } from './order-lines.js';
import { RefundsSection } from './refunds-section.js';
import { ResendLink } from './resend-link.js';

type Mail = WorkshopOrder['mails'][number];

/** While a refund waits for the payment service. */
const askedEveryMs = 1500;

const mailColumns: Column<Mail>[] = [
  { key: 'subject', header: texts.mailColumns.subject, isHeading: true, cell: (mail) => mail.subject },
  {
    key: 'state',
    header: texts.mailColumns.state,
    cell: (mail) => texts.mailStates[mail.state] ?? mail.state,
  },
  {
    key: 'sent',
    header: texts.mailColumns.sent,
    cell: (mail) => (mail.sentAt ? dateTime(mail.sentAt) : texts.none),
  },
];

const Section = ({ title, children }: { title: string; children: ReactNode }) => (
  <Box as="section" marginTop="10">
    <Heading level={2} look="subsection" marginBottom="2">
      {title}
    </Heading>
    {children}
  </Box>
);

/** One order with its whole history. */
export function WorkshopOrderPage() {
  const { orderId = '' } = useParams();
  const {
    data: order,
    fault,
    mutate,
  } = useEndpoint(
    'GET /workshop/orders/:orderId',
    { params: { orderId } },
    {
      refreshInterval: (one) => (one?.refunds.some((refund) => refund.state === 'asked') ? askedEveryMs : 0),
    },
  );
  if (!order)
    return (
      <Band>
        {fault ? (
          <Fault what={texts.notFound} fault={fault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );
  return (
    <>
      <PageTitle title={orderTexts.documentTitle(order.number)} />
      <SplitSheet
        asideLabel={texts.evidence}
        main={
          <>
            <Text isSoft>
              <TextLink to={paths.workshop.orders.to()}>{ordersTexts.title}</TextLink>
            </Text>
            <Heading level={1} marginBottom="6">
              {order.number}{' '}
              <Box as="span" fontWeight="normal" color="ink.soft">
                {orderStateTexts[order.state]}
              </Box>
            </Heading>
            <OrderLines order={order} />
            {order.refunds.length > 0 && (
              <Section title={refundTexts.section}>
                <RefundsSection order={order} />
              </Section>
            )}
            {order.disputes.length > 0 && (
              <Section title={refundTexts.disputes}>
                <DisputesSection disputes={order.disputes} />
              </Section>
            )}
            <Section title={texts.evidence}>
              <OrderEvidence order={order} />
            </Section>
            <Section title={texts.mails}>
              {order.mails.length === 0 ? (
                <Text isSoft>{texts.noMails}</Text>
              ) : (
                <HairlineTable
                  caption={texts.mailsCaption}
                  columns={mailColumns}
                  rows={order.mails}
                  rowKey={(mail) => mail.id}
                />
              )}
            </Section>
            <Section title={texts.history}>
              <OrderHistory order={order} />
            </Section>
          </>
        }
        aside={
          <>
            {order.flags.length > 0 && (
              <Box marginBottom="6">
                <Heading level={2} look="subsection" marginBottom="2">
                  {texts.flags}
                </Heading>
                <OrderFlagLines order={order} />
              </Box>
            )}
            <Box display="grid" gap="4" justifyItems="start">
              <ResendLink order={order} />
              <GiveMoneyBack order={order} />
              {order.receiptNumber && (
                <AnchorButton
                  look="outline"
                  href={apiAddress('GET /workshop/orders/:orderId/receipt.pdf', {
                    params: { orderId: order.id },
                  })}
                >
                  {texts.receiptPdf}
                </AnchorButton>
              )}
            </Box>
          </>
        }
        block={
          <TitleBlock
            columns={2}
            fields={[
              { name: texts.placed, value: dateTime(order.placedAt) },
              { name: texts.paid, value: order.paidAt ? dateTime(order.paidAt) : texts.none },
              { name: texts.receipt, value: order.receiptNumber ?? texts.none },
              { name: texts.country, value: order.country },
            ]}
            summary={{ name: texts.total, value: price(order.total) }}
          />
        }
      />
    </>
  );
}
