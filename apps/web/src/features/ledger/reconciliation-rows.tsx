import { Box } from '@chakra-ui/react/box';
import { movementKinds, type ReconciliationRow, verdicts, type Verdict } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { ledgerTexts, reconciliationTexts as texts } from '../../config/texts/workshop-ledger.js';
import { dateTime, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextLink } from '../../ui/link.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Unbroken } from '../../ui/unbroken.js';

const isAtOne = (verdict: Verdict) => verdict === 'agrees' || verdict === 'not-ours';

const Finding = ({ row }: { row: ReconciliationRow }) => (
  <>
    <StatusMark state={row.verdict === 'agrees' ? 'ok' : row.verdict === 'not-ours' ? 'none' : 'warn'}>
      {texts.verdicts[row.verdict]}
    </StatusMark>
    {!isAtOne(row.verdict) && (
      <Box fontSize="sm" lineHeight="snug" color="ink.soft" maxWidth="narrow">
        {texts.meanings[row.verdict]}
      </Box>
    )}
  </>
);

const amountColumn = (key: 'here' | 'there'): Column<ReconciliationRow> => ({
  key,
  header: texts.rowColumns[key],
  isNumeric: true,
  cell: (row) => {
    const amount = row[key];
    return <Unbroken>{amount ? price(amount) : ledgerTexts.none}</Unbroken>;
  },
});

const columns: Column<ReconciliationRow>[] = [
  {
    key: 'subject',
    header: texts.rowColumns.subject,
    isHeading: true,
    cell: (row) =>
      row.orderId ? (
        <TextLink
          to={paths.workshop.order.to({ orderId: row.orderId })}
          fontWeight="semibold"
          whiteSpace="nowrap"
        >
          {row.subject}
        </TextLink>
      ) : (
        (row.subject ?? ledgerTexts.none)
      ),
  },
  { key: 'kind', header: texts.rowColumns.kind, cell: (row) => texts.oneKind[row.kind] },
  { key: 'at', header: texts.rowColumns.at, cell: (row) => <Unbroken>{dateTime(row.at)}</Unbroken> },
  {
    key: 'verdict',
    header: texts.rowColumns.verdict,
    cell: (row) => (
      <Box>
        <Finding row={row} />
      </Box>
    ),
  },
  {
    key: 'reference',
    header: texts.rowColumns.reference,
    cell: (row) => (
      <Box as="span" fontFamily="mono" fontSize="xs">
        {row.paymentIntentId ?? row.serviceId}
      </Box>
    ),
  },
  amountColumn('here'),
  amountColumn('there'),
];

/** Every movement, the differing ones first. None is left out; filters narrow what is in sight. */
export function ReconciliationRows({ reconciliationId }: { reconciliationId: string }) {
  const table = useTableState();
  const { page, size, search } = table.state;
  const verdict = verdicts.find((one) => one === table.filters['verdict']);
  const kind = movementKinds.find((one) => one === table.filters['kind']);
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/reconciliations/:reconciliationId/rows',
    { params: { reconciliationId }, query: { page, size, search: search || undefined, verdict, kind } },
    { keepPreviousData: true },
  );
  if (fault && !data) return <Fault fault={fault} onAgain={() => void mutate()} level={2} />;
  return (
    <DataTable
      caption={texts.rowsCaption}
      columns={columns}
      answer={data}
      rowKey={(row) => String(row.position)}
      table={table}
      searchLabel={texts.search}
      filters={
        <>
          <Box flex="0 1 12rem">
            <SelectField
              label={texts.verdict}
              emptyLabel={texts.everything}
              value={verdict ?? ''}
              onChange={(event) => table.change({ verdict: event.target.value || undefined })}
              options={verdicts.map((value) => ({ value, label: texts.verdicts[value] }))}
            />
          </Box>
          <Box flex="0 1 10rem">
            <SelectField
              label={texts.kind}
              emptyLabel={texts.allKinds}
              value={kind ?? ''}
              onChange={(event) => table.change({ kind: event.target.value || undefined })}
              options={movementKinds.map((value) => ({ value, label: texts.kinds[value] }))}
            />
          </Box>
        </>
      }
      empty={
        <EmptyState title={texts.noRows} level={3}>
          {texts.noRowsDetail}
        </EmptyState>
      }
    />
  );
}
