import { Box } from '@chakra-ui/react/box';
import type { CountryRates } from '@windchest/contracts';
import { useMemo } from 'react';
import { ledgerTexts } from '../../config/texts/workshop-ledger.js';
import { ratesTexts as texts } from '../../config/texts/workshop-tax.js';
import { number } from '../../lib/format.js';
import { countryName, day } from '../../lib/workshop-format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Details } from '../../ui/details.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Unbroken } from '../../ui/unbroken.js';
import { EnterRate } from './enter-rate.js';
import { LedgerHead } from './ledger-head.js';
import { RateChanges } from './rate-changes.js';
import { TakeBackRate } from './take-back-rate.js';

/** The steps that neither hold now nor come next. */
const earlierOf = ({ steps, current, next }: CountryRates) =>
  steps.filter((step) => step.validFrom !== current?.validFrom && step.validFrom !== next?.validFrom);

const Earlier = ({ row }: { row: CountryRates }) => {
  const earlier = earlierOf(row);
  return earlier.length === 0 ? null : (
    <Box fontSize="sm" color="ink.soft" fontWeight="normal">
      <Details summary={texts.history(earlier.length)} gap="2">
        <Box as="ul" listStyle="none">
          {earlier.map((step) => (
            <li key={step.validFrom}>{texts.earlier(step.ratePercent, day(step.validFrom))}</li>
          ))}
        </Box>
      </Details>
    </Box>
  );
};

const columnsFor = (isWritable: boolean): Column<CountryRates>[] => [
  {
    key: 'country',
    header: texts.columns.country,
    isHeading: true,
    cell: (row) => (
      <Box>
        {countryName(row.country)}
        <Earlier row={row} />
      </Box>
    ),
  },
  {
    key: 'rate',
    header: texts.columns.rate,
    isNumeric: true,
    cell: (row) =>
      row.current ? <Unbroken>{texts.percent(row.current.ratePercent)}</Unbroken> : texts.notYet,
  },
  {
    key: 'since',
    header: texts.columns.since,
    cell: (row) => (row.current ? <Unbroken>{day(row.current.validFrom)}</Unbroken> : ledgerTexts.none),
  },
  {
    key: 'next',
    header: texts.columns.next,
    cell: (row) =>
      row.next ? (
        <Box>
          {texts.nextFrom(row.next.ratePercent, day(row.next.validFrom))}{' '}
          {isWritable && <TakeBackRate row={row} next={row.next} />}
        </Box>
      ) : (
        ledgerTexts.none
      ),
  },
  {
    key: 'source',
    header: texts.columns.source,
    width: '30%',
    cell: (row) => <Box fontSize="sm">{row.current?.source ?? row.next?.source}</Box>,
  },
  { key: 'receipts', header: texts.columns.receipts, isNumeric: true, cell: (row) => number(row.receipts) },
];

/** Countries that are sold to and have none. */
function MissingRates() {
  const { data } = useEndpoint('GET /workshop/ledger/rates/missing');
  if (!data || data.length === 0) return null;
  return (
    <Box marginBottom="6">
      <Notice tone="warn" title={texts.missing}>
        {data.map((one) => texts.missingOne(countryName(one.country), one.receipts)).join(', ')}.{' '}
        {texts.missingDetail}
      </Notice>
    </Box>
  );
}

/** What is charged where, since when, and what comes. */
export function RatesPage() {
  const { may } = useSession();
  const isWritable = may('tax:write');
  const columns = useMemo(() => columnsFor(isWritable), [isWritable]);
  const table = useTableState();
  const { page, size, search } = table.state;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/rates',
    { query: { page, size, search: search || undefined } },
    { keepPreviousData: true },
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <LedgerHead title={texts.title} lead={texts.lead} isAboutTax />
      <MissingRates />
      {isWritable && (
        <Box marginBottom="5">
          <EnterRate />
        </Box>
      )}
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(row) => `${row.country} ${row.kind}`}
          table={table}
          searchLabel={texts.search}
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
      <RateChanges />
    </Band>
  );
}
