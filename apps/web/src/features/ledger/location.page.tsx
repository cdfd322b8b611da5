import { Box } from '@chakra-ui/react/box';
import type { UnclearLocation } from '@windchest/contracts';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { locationsTexts as texts } from '../../config/texts/workshop-tax.js';
import { date, price } from '../../lib/format.js';
import { countryName } from '../../lib/workshop-format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { SettleForm } from './settle-form.js';

const Evidence = ({ location }: { location: UnclearLocation }) => (
  <Box as="section" marginTop="8" maxWidth="measure">
    <Heading level={2} look="subsection" marginBottom="2">
      {texts.evidence}
    </Heading>
    <Box as="dl">
      {(
        [
          [texts.declared, location.declared],
          [texts.billing, location.billing],
          [texts.card, location.card],
        ] as const
      ).map(([name, code]) => (
        <Box
          key={name}
          display="flex"
          justifyContent="space-between"
          gap="6"
          paddingBlock="2"
          borderBottomWidth="1px"
          borderColor="hairline"
        >
          <Box as="dt" color="ink.soft">
            {name}
          </Box>
          <Box as="dd" fontWeight="semibold">
            {code ? countryName(code) : texts.unknown}
          </Box>
        </Box>
      ))}
    </Box>
    <Text look="small" isSoft marginTop="4">
      {texts.rule}
    </Text>
    <Text look="small" isSoft marginTop="2">
      {texts.stays}
    </Text>
  </Box>
);

/** One receipt: what is known of where its buyer is, and where it counts. */
export function LocationPage() {
  const { receiptId = '' } = useParams();
  const { may } = useSession();
  const { data, fault, mutate } = useEndpoint('GET /workshop/ledger/locations/:receiptId', {
    params: { receiptId },
  });
  if (!data)
    return (
      <Band>
        {fault ? (
          <Fault what={texts.notFound} fault={fault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );
  const { settled } = data;
  return (
    <>
      <PageTitle title={texts.heading(data.receiptNumber)} />
      <SplitSheet
        asideLabel={texts.settle}
        main={
          <>
            <Text isSoft>
              <TextLink to={paths.workshop.locations.to()}>{texts.title}</TextLink>
            </Text>
            <Heading level={1}>{texts.heading(data.receiptNumber)}</Heading>
            <Evidence location={data} />
          </>
        }
        aside={
          <>
            <Heading level={2} look="subsection" marginBottom="4">
              {texts.settle}
            </Heading>
            {settled && (
              <Box marginBottom="5">
                <Notice
                  tone="ok"
                  title={texts.wasSettled(countryName(settled.country), settled.who, date(settled.at))}
                >
                  {settled.reason}
                </Notice>
              </Box>
            )}
            {data.isQuarterClosed ? (
              <Text>{texts.quarterClosed}</Text>
            ) : (
              may('tax:write') && <SettleForm key={settled?.at ?? ''} location={data} />
            )}
          </>
        }
        block={
          <TitleBlock
            columns={2}
            fields={[
              { name: texts.columns.issued, value: date(data.issuedAt) },
              {
                name: texts.order,
                value: (
                  <TextLink to={paths.workshop.order.to({ orderId: data.orderId })}>
                    {data.orderNumber}
                  </TextLink>
                ),
              },
              { name: texts.counts, value: texts.rate(countryName(data.country), data.ratePercent) },
              { name: texts.columns.buyer, value: data.email },
            ]}
            summary={{ name: texts.columns.total, value: price(data.total) }}
          />
        }
      />
    </>
  );
}
