import { Box } from '@chakra-ui/react/box';
import type { Supporter } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { useParams, useSearchParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { keepsTexts, pledgeStateTexts } from '../../config/texts/pledge.js';
import { supportersTexts, supporterTexts as texts } from '../../config/texts/workshop-supporters.js';
import { date, dateTime, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { StatusLine } from '../../ui/status-mark.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { ordersTexts } from '../../config/texts/workshop-orders.js';
import { MailsTable } from './mails-table.js';
import { PledgePayments } from './pledge-payments.js';

const Section = ({ title, children }: { title: string; children: ReactNode }) => (
  <Box as="section" marginTop="10">
    <Heading level={2} look="subsection" marginBottom="2">
      {title}
    </Heading>
    {children}
  </Box>
);

const Ruled = ({ name, children }: { name: ReactNode; children: ReactNode }) => (
  <Box
    display="grid"
    gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: '11rem minmax(0, 1fr)' }}
    columnGap="4"
    paddingBlock="2"
    borderBottomWidth="1px"
    borderColor="hairline"
  >
    {name}
    {children}
  </Box>
);

const Evidence = ({ supporter }: { supporter: Supporter }) => {
  const facts: [string, ReactNode][] = [
    [texts.email, supporter.email || texts.none],
    [texts.country, supporter.country],
    [texts.kits, supporter.kits.map(({ name }) => name).join(', ') || texts.none],
    [texts.keeps, keepsTexts[supporter.keepsAfter]],
    [texts.customer, supporter.customerId ?? texts.none],
    [texts.subscription, supporter.subscriptionId ?? texts.none],
    [texts.consent, `${dateTime(supporter.consentAt)}: “${supporter.consentText}”`],
  ];
  return (
    <Box as="dl">
      {facts.map(([name, value]) => (
        <Ruled
          key={name}
          name={
            <Box as="dt" color="ink.soft">
              {name}
            </Box>
          }
        >
          <Box as="dd" overflowWrap="anywhere">
            {value}
          </Box>
        </Ruled>
      ))}
    </Box>
  );
};

const History = ({ history }: { history: Supporter['history'] }) => (
  <Box as="ol" listStyle="none">
    {history.map((entry, at) => (
      <li key={`${entry.at} ${at}`}>
        <Ruled
          name={
            <Box as="time" color="ink.soft">
              {dateTime(entry.at)}
            </Box>
          }
        >
          <Box overflowWrap="anywhere">
            {entry.what}
            {entry.detail && (
              <Box fontSize="sm" lineHeight="snug" color="ink.soft">
                {entry.detail}
              </Box>
            )}
          </Box>
        </Ruled>
      </li>
    ))}
  </Box>
);

function Payments({ pledgeId }: { pledgeId: string }) {
  const [search] = useSearchParams();
  const page = Math.max(1, Number(search.get('payments')) || 1);
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/supporters/:pledgeId/payments',
    { params: { pledgeId }, query: { page, size: 12 } },
    { keepPreviousData: true },
  );
  return (
    <PledgePayments
      answer={data}
      fault={fault}
      onAgain={() => void mutate()}
      addressOf={(change) => paths.workshop.supporter.to({ pledgeId }, { payments: change.page })}
    />
  );
}

const day = (moment: string | null) => (moment ? date(moment) : texts.none);
const endOf = ({ endedAt, endsAt, nextPaymentAt }: Supporter) => {
  if (endedAt) return { name: texts.ended, value: day(endedAt) };
  return endsAt ? { name: texts.ends, value: day(endsAt) } : { name: texts.next, value: day(nextPaymentAt) };
};

/** One supporter's pledge with its whole history. */
export function SupporterPage() {
  const { pledgeId = '' } = useParams();
  const {
    data: supporter,
    fault,
    mutate,
  } = useEndpoint('GET /workshop/supporters/:pledgeId', { params: { pledgeId } });
  if (!supporter)
    return (
      <Band>
        {fault ? (
          <Fault what={texts.notFound} fault={fault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );
  const name = supporter.name || supporter.email || texts.none;
  return (
    <>
      <PageTitle title={name} />
      <SplitSheet
        asideLabel={texts.evidence}
        main={
          <>
            <Text isSoft>
              <TextLink to={paths.workshop.supporters.to()}>{supportersTexts.title}</TextLink>
            </Text>
            <Heading level={1}>
              {name}{' '}
              <Box as="span" fontWeight="normal" color="ink.soft">
                {pledgeStateTexts[supporter.state]}
              </Box>
            </Heading>
            <Section title={texts.payments}>
              <Payments pledgeId={supporter.id} />
            </Section>
            <Section title={texts.history}>
              <History history={supporter.history} />
            </Section>
            <Section title={texts.mails}>
              {supporter.mails.length === 0 ? (
                <Text isSoft>{texts.noMails}</Text>
              ) : (
                <MailsTable mails={supporter.mails} />
              )}
            </Section>
          </>
        }
        aside={
          <>
            {supporter.flags.length > 0 && (
              <Box marginBottom="8">
                <Heading level={2} look="subsection" marginBottom="2">
                  {texts.flags}
                </Heading>
                <Box as="ul" listStyle="none">
                  {supporter.flags.map((flag) => (
                    <StatusLine key={flag} state="warn">
                      {ordersTexts.flags[flag] ?? flag}
                      <Box fontSize="sm" lineHeight="snug" color="ink.soft">
                        {texts.flagDetails[flag]}
                      </Box>
                    </StatusLine>
                  ))}
                </Box>
              </Box>
            )}
            <Heading level={2} look="subsection" marginBottom="2">
              {texts.evidence}
            </Heading>
            <Evidence supporter={supporter} />
          </>
        }
        block={
          <TitleBlock
            columns={2}
            fields={[
              { name: texts.plan, value: supporter.plan.name },
              { name: texts.amount, value: price(supporter.amount) },
              { name: texts.since, value: day(supporter.beganAt) },
              { name: texts.paidUntil, value: day(supporter.paidUntil) },
              endOf(supporter),
              { name: texts.card, value: supporter.cardLast4 ?? texts.none },
            ]}
            summary={{ name: texts.paid, value: price(supporter.paid) }}
          />
        }
      />
    </>
  );
}
