import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { orderStateTexts, orderTexts } from '../../config/texts/order.js';
import { ordersTexts, workshopOrderTexts as texts } from '../../config/texts/workshop-orders.js';
import { dateTime, number, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { OrderFlagLines } from './order-flags.js';
import { OrderLines } from './order-lines.js';
import { ResendLink } from './resend-link.js';

type Mail = WorkshopOrder['mails'][number];

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

const Evidence = ({ order }: { order: WorkshopOrder }) => {
  const facts: [string, ReactNode][] = [
    [texts.email, order.email],
    [texts.country, order.country],
    [texts.paymentSession, order.paymentSessionId ?? texts.none],
    [texts.paymentIntent, order.paymentIntentId ?? texts.none],
    [texts.consent, `${dateTime(order.consentAt)}: “${order.consentText}”`],
    [texts.downloads, number(order.downloads)],
  ];
  return (
    <Box as="dl">
      {facts.map(([name, value]) => (
        <Box
          key={name}
          display="grid"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: '9rem minmax(0, 1fr)' }}
          columnGap="4"
          paddingBlock="2"
          borderBottomWidth="1px"
          borderColor="hairline"
        >
          <Box as="dt" color="ink.soft">
            {name}
          </Box>
          <Box as="dd" overflowWrap="anywhere">
            {value}
          </Box>
        </Box>
      ))}
    </Box>
  );
};

const History = ({ order }: { order: WorkshopOrder }) =>
  order.history.length === 0 ? (
    <Text isSoft>{texts.noHistory}</Text>
  ) : (
    <Box as="ol" listStyle="none">
      {order.history.map((entry, at) => (
        <Box
          as="li"
          key={`${entry.at} ${at}`}
          display="grid"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: '11rem minmax(0, 1fr)' }}
          columnGap="4"
          paddingBlock="2"
          borderBottomWidth="1px"
          borderColor="hairline"
        >
          <Box as="time" color="ink.soft">
            {dateTime(entry.at)}
          </Box>
          <Box overflowWrap="anywhere">
            {entry.what}
            {entry.detail && (
              <Box fontSize="sm" lineHeight="snug" color="ink.soft">
                {entry.detail}
              </Box>
            )}
          </Box>
        </Box>
      ))}
    </Box>
  );

/** One order with its whole history. */
export function WorkshopOrderPage() {
  const { orderId = '' } = useParams();
  const {
    data: order,
    fault,
    mutate,
  } = useEndpoint('GET /workshop/orders/:orderId', { params: { orderId } });
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
            <Section title={texts.evidence}>
              <Evidence order={order} />
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
              <History order={order} />
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
                <OrderFlagLines flags={order.flags} />
              </Box>
            )}
            <ResendLink order={order} />
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
