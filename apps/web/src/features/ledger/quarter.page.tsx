import { Box } from '@chakra-ui/react/box';
import type { QuarterSummary, SummaryRow } from '@windchest/contracts';
import { useParams } from 'react-router-dom';
import { quarterTexts as texts, quartersTexts } from '../../config/texts/workshop-tax.js';
import { apiAddress } from '../../lib/api-address.js';
import { number, price } from '../../lib/format.js';
import { countryName, day } from '../../lib/workshop-format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { AnchorButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { Unbroken } from '../../ui/unbroken.js';
import { CloseQuarter } from './close-quarter.js';
import { LedgerHead } from './ledger-head.js';
import { QuarterNotices } from './quarter-notices.js';
import { SummaryTable } from './summary-table.js';

type Business = QuarterSummary['reverseCharge'][number];

const treatments = Object.keys(texts.sections) as SummaryRow['treatment'][];
const businessColumns: Column<Business>[] = [
  { key: 'name', header: texts.businessColumns.name, isHeading: true, cell: (one) => one.name },
  { key: 'vatNumber', header: texts.businessColumns.vatNumber, cell: (one) => one.vatNumber },
  { key: 'country', header: texts.businessColumns.country, cell: (one) => countryName(one.country) },
  {
    key: 'net',
    header: texts.businessColumns.net,
    isNumeric: true,
    cell: (one) => <Unbroken>{price(one.net)}</Unbroken>,
  },
];

const ByBusiness = ({ rows }: { rows: readonly Business[] }) => (
  <Box as="section" marginBottom="9">
    <Heading level={2} look="subsection" marginBottom="2">
      {texts.byBusiness}
    </Heading>
    <Text look="small" isSoft marginBottom="2">
      {texts.formOnly}
    </Text>
    <HairlineTable
      caption={texts.businessCaption}
      columns={businessColumns}
      rows={rows}
      rowKey={(one) => `${one.vatNumber} ${one.net.currency}`}
    />
  </Box>
);

const Totals = ({ summary }: { summary: QuarterSummary }) => (
  <Box display="grid" gap="4" maxWidth="measure" marginLeft="auto">
    {summary.totals.map((total) => (
      <TitleBlock
        key={total.gross.currency}
        isFramed
        columns={3}
        fields={[
          { name: texts.blockNet, value: price(total.net) },
          { name: texts.blockTax, value: price(total.tax) },
          { name: texts.blockFree, value: number(summary.freeReceipts) },
        ]}
        summary={{ name: texts.total, value: price(total.gross) }}
      />
    ))}
  </Box>
);

const Summary = ({ summary }: { summary: QuarterSummary }) => {
  const { may } = useSession();
  const { year, quarter, rows } = summary;
  return (
    <>
      <QuarterNotices summary={summary} />
      <Box display="flex" flexWrap="wrap" gap="4" marginBottom="8">
        <AnchorButton
          href={apiAddress('GET /workshop/ledger/quarters/:year/:quarter/summary.csv', {
            params: { year, quarter },
          })}
          download
        >
          {texts.csv}
        </AnchorButton>
        {summary.isOver && !summary.closedAt && may('tax:write') && <CloseQuarter summary={summary} />}
      </Box>
      {rows.length === 0 && <Text isSoft>{texts.empty}</Text>}
      {treatments.map((treatment) => {
        const own = rows.filter((row) => row.treatment === treatment);
        return own.length === 0 ? null : (
          <SummaryTable
            key={treatment}
            treatment={treatment}
            rows={own}
            missingRates={summary.missingRates}
          />
        );
      })}
      {summary.reverseCharge.length > 0 && <ByBusiness rows={summary.reverseCharge} />}
      <Totals summary={summary} />
    </>
  );
};

/** A quarter by country and rate, as it is declared. */
export function QuarterPage() {
  const { year = '', quarter = '' } = useParams();
  const { data, fault, mutate } = useEndpoint('GET /workshop/ledger/quarters/:year/:quarter', {
    params: { year: Number(year), quarter: Number(quarter) },
  });
  const name = quartersTexts.name(Number(year), Number(quarter));
  return (
    <Band>
      <PageTitle title={name} />
      <LedgerHead title={name} lead={data && texts.span(day(data.from), day(data.to))} isAboutTax />
      {data ? (
        <Summary summary={data} />
      ) : fault ? (
        <Fault what={texts.notFound} fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <SkeletonLines lines={6} />
      )}
    </Band>
  );
}
