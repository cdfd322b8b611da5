import { Box } from '@chakra-ui/react/box';
import type { UnclearLocation } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { locationsTexts as texts } from '../../config/texts/workshop-tax.js';
import { date, price } from '../../lib/format.js';
import { countryName } from '../../lib/workshop-format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Unbroken } from '../../ui/unbroken.js';
import { LedgerHead } from './ledger-head.js';

const orUnknown = (code: string | null) => (code ? countryName(code) : texts.unknown);

const columns: Column<UnclearLocation>[] = [
  {
    key: 'receipt',
    header: texts.columns.receipt,
    isHeading: true,
    cell: (one) => (
      <TextLink
        to={paths.workshop.location.to({ receiptId: one.receiptId })}
        fontWeight="semibold"
        whiteSpace="nowrap"
      >
        {one.receiptNumber}
      </TextLink>
    ),
  },
  { key: 'issued', header: texts.columns.issued, cell: (one) => <Unbroken>{date(one.issuedAt)}</Unbroken> },
  {
    key: 'buyer',
    header: texts.columns.buyer,
    cell: (one) => (
      <Box lineHeight="1.4">
        <Box>{one.email}</Box>
        <TextLink to={paths.workshop.order.to({ orderId: one.orderId })} fontSize="sm">
          {one.orderNumber}
        </TextLink>
      </Box>
    ),
  },
  {
    key: 'evidence',
    header: texts.columns.evidence,
    cell: (one) => [one.declared, one.billing, one.card].map(orUnknown).join(', '),
  },
  {
    key: 'counted',
    header: texts.columns.counted,
    cell: (one) => (
      <Box lineHeight="1.4">
        <Box>{texts.rate(countryName(one.country), one.ratePercent)}</Box>
        {one.settled && (
          <Box fontSize="sm" color="ink.soft">
            {one.settled.reason}
          </Box>
        )}
      </Box>
    ),
  },
  {
    key: 'total',
    header: texts.columns.total,
    isNumeric: true,
    cell: (one) => <Unbroken>{price(one.total)}</Unbroken>,
  },
];

/** Receipts whose country is unclear, and those that somebody has settled. */
export function LocationsPage() {
  const table = useTableState();
  const { page, size, search } = table.state;
  const state = table.filters['state'] === 'settled' ? 'settled' : 'open';
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/locations',
    { query: { state, page, size, search: search || undefined } },
    { keepPreviousData: true },
  );
  const isEmptyForGood = data?.total === 0 && !search;
  const views = (
    <Box flex="0 1 13rem">
      <SelectField
        label={texts.view}
        value={state}
        onChange={(event) =>
          table.change({ state: event.target.value === 'settled' ? 'settled' : undefined })
        }
        options={Object.entries(texts.views).map(([value, label]) => ({ value, label }))}
      />
    </Box>
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <LedgerHead title={texts.title} lead={texts.lead} isAboutTax />
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : isEmptyForGood ? (
        <>
          <Box marginBottom="6">{views}</Box>
          <EmptyState title={state === 'open' ? texts.empty : texts.nothingSettled}>
            {state === 'open' ? texts.emptyDetail : texts.nothingSettledDetail}
          </EmptyState>
        </>
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(one) => one.receiptId}
          table={table}
          searchLabel={texts.search}
          filters={views}
          empty={null}
        />
      )}
    </Band>
  );
}
