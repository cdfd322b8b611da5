import { Box } from '@chakra-ui/react/box';
import type { InputOf, OutputOf } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { paymentsTexts as texts } from '../../config/texts/workshop-ledger.js';
import { apiAddress } from '../../lib/api-address.js';
import { dateTime, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Unbroken } from '../../ui/unbroken.js';
import { LedgerHead } from './ledger-head.js';

type Payment = OutputOf<'GET /workshop/ledger/payments'>['items'][number];
type Kind = NonNullable<NonNullable<InputOf<'GET /workshop/ledger/payments'>['query']>['kind']>;

const columns: Column<Payment>[] = [
  {
    key: 'subject',
    header: texts.columns.subject,
    isHeading: true,
    cell: (one) =>
      one.orderId ? (
        <TextLink
          to={paths.workshop.order.to({ orderId: one.orderId })}
          fontWeight="semibold"
          whiteSpace="nowrap"
        >
          {one.subject}
        </TextLink>
      ) : (
        one.subject
      ),
  },
  { key: 'kind', header: texts.columns.kind, cell: (one) => texts.kinds[one.kind] },
  { key: 'at', header: texts.columns.at, cell: (one) => <Unbroken>{dateTime(one.at)}</Unbroken> },
  { key: 'email', header: texts.columns.email, cell: (one) => one.email },
  { key: 'state', header: texts.columns.state, cell: (one) => texts.states[one.state] ?? one.state },
  {
    key: 'reference',
    header: texts.columns.reference,
    cell: (one) => (
      <Box as="span" fontFamily="mono" fontSize="xs">
        {one.reference}
      </Box>
    ),
  },
  {
    key: 'amount',
    header: texts.columns.amount,
    isNumeric: true,
    cell: (one) => <Unbroken>{price(one.amount)}</Unbroken>,
  },
];

const isKind = (text: string | undefined): text is Kind => text !== undefined && text in texts.kinds;
const dayIn = (text: string | undefined) => (/^\d{4}-\d{2}-\d{2}$/.test(text ?? '') ? text : undefined);

/** All money that came and went. */
export function PaymentsPage() {
  const table = useTableState();
  const { page, size, search } = table.state;
  const kind = isKind(table.filters['kind']) ? table.filters['kind'] : undefined;
  const narrowing = {
    kind,
    from: dayIn(table.filters['from']),
    to: dayIn(table.filters['to']),
    search: search || undefined,
  };
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/payments',
    { query: { ...narrowing, page, size } },
    { keepPreviousData: true },
  );
  const dayField = (key: 'from' | 'to') => (
    <Box flex="0 1 10rem">
      <TextField
        label={texts[key]}
        type="date"
        value={narrowing[key] ?? ''}
        onChange={(event) => table.change({ [key]: event.target.value || undefined })}
      />
    </Box>
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <LedgerHead title={texts.title} lead={texts.lead} />
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(one) => one.id}
          table={table}
          searchLabel={texts.search}
          filters={
            <>
              <Box flex="0 1 10rem">
                <SelectField
                  label={texts.kind}
                  emptyLabel={texts.allKinds}
                  value={kind ?? ''}
                  onChange={(event) => table.change({ kind: event.target.value || undefined })}
                  options={Object.entries(texts.kinds).map(([value, label]) => ({ value, label }))}
                />
              </Box>
              {dayField('from')}
              {dayField('to')}
            </>
          }
          csvHref={apiAddress('GET /workshop/ledger/payments.csv', { query: narrowing })}
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
    </Band>
  );
}
