import { Box } from '@chakra-ui/react/box';
import type { InputOf, ReceiptRow } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { receiptsTexts as texts } from '../../config/texts/workshop-receipts.js';
import { apiAddress } from '../../lib/api-address.js';
import { date, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextAnchor, TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Heading, Text } from '../../ui/text.js';
import { Unbroken } from '../../ui/unbroken.js';
import { countryOptions } from '../basket/country-options.js';
import { LedgerTabs } from './ledger-head.js';
import { yearsUntil } from './receipt-years.js';

type Query = NonNullable<InputOf<'GET /workshop/receipts'>['query']>;

const pdfOf = ({ id, kind, orderId }: ReceiptRow): string =>
  kind === 'receipt'
    ? apiAddress('GET /workshop/orders/:orderId/receipt.pdf', { params: { orderId } })
    : apiAddress('GET /workshop/orders/:orderId/credit-notes/:creditNoteId.pdf', {
        params: { orderId, creditNoteId: id },
      });

const amountColumn = (key: 'net' | 'tax' | 'total', isSortable = false): Column<ReceiptRow> => ({
  key,
  header: texts.columns[key],
  isNumeric: true,
  isSortable,
  cell: (row) => <Unbroken>{price(row[key])}</Unbroken>,
});

const columns: Column<ReceiptRow>[] = [
  {
    key: 'number',
    header: texts.columns.number,
    isHeading: true,
    isSortable: true,
    cell: (row) => (
      <TextAnchor href={pdfOf(row)} fontWeight="semibold" whiteSpace="nowrap">
        {row.number}
      </TextAnchor>
    ),
  },
  { key: 'kind', header: texts.columns.kind, cell: (row) => texts.kinds[row.kind] },
  {
    key: 'issuedAt',
    header: texts.columns.issuedAt,
    isSortable: true,
    cell: (row) => <Unbroken>{date(row.issuedAt)}</Unbroken>,
  },
  {
    key: 'order',
    header: texts.columns.order,
    cell: (row) => (
      <Box lineHeight="1.4">
        {row.orderId ? (
          <TextLink to={paths.workshop.order.to({ orderId: row.orderId })} whiteSpace="nowrap">
            {row.orderNumber}
          </TextLink>
        ) : (
          <Unbroken>{row.orderNumber}</Unbroken>
        )}
        <Box color="ink.soft">{row.email}</Box>
      </Box>
    ),
  },
  { key: 'country', header: texts.columns.country, cell: (row) => row.country },
  amountColumn('net'),
  amountColumn('tax'),
  amountColumn('total', true),
];

const isKind = (text: string | undefined): text is ReceiptRow['kind'] =>
  text !== undefined && text in texts.kinds;
const isSorting = (text: string | undefined): text is NonNullable<Query['sort']> =>
  text === 'number' || text === 'issuedAt' || text === 'total';
const years = yearsUntil(new Date());
const defaults = { sort: 'issuedAt', order: 'desc' } as const;

/** Every receipt and credit note, by number, year and country. */
export function ReceiptsPage() {
  const { session } = useSession();
  const table = useTableState(defaults);
  const { page, size, search, sort, order } = table.state;
  const kind = isKind(table.filters['kind']) ? table.filters['kind'] : undefined;
  const year = /^2\d{3}$/.test(table.filters['year'] ?? '') ? Number(table.filters['year']) : undefined;
  const country = /^[A-Z]{2}$/.test(table.filters['country'] ?? '') ? table.filters['country'] : undefined;
  const narrowing = { kind, year, country, search: search || undefined };
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/receipts',
    { query: { ...narrowing, page, size, order, sort: isSorting(sort) ? sort : 'issuedAt' } },
    { keepPreviousData: true },
  );
  const filter = (
    key: 'kind' | 'year' | 'country',
    value: string | number | undefined,
    emptyLabel: string,
    options: { value: string; label: string }[],
  ) => (
    <Box flex="0 1 12rem">
      <SelectField
        label={texts[key]}
        emptyLabel={emptyLabel}
        value={value === undefined ? '' : String(value)}
        onChange={(event) => table.change({ [key]: event.target.value || undefined })}
        options={options}
      />
    </Box>
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <LedgerTabs />
      <Heading level={1}>{texts.title}</Heading>
      <Text look="lead" marginTop="2" marginBottom="1">
        {texts.lead}
      </Text>
      <Text look="small" isSoft marginBottom="6">
        {texts.notAdvice}
      </Text>
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(row) => row.id}
          table={table}
          searchLabel={texts.search}
          filters={
            <>
              {filter(
                'kind',
                kind,
                texts.allKinds,
                Object.entries(texts.kinds).map(([value, label]) => ({ value, label })),
              )}
              {filter('year', year, texts.allYears, years)}
              {filter(
                'country',
                country,
                texts.allCountries,
                countryOptions(session?.workshop.locale ?? 'en-GB', {
                  languages: [],
                  workshopCountry: session?.workshop.country,
                }),
              )}
            </>
          }
          csvHref={apiAddress('GET /workshop/receipts.csv', { query: narrowing })}
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
    </Band>
  );
}
