import type { OutputOf } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { quartersTexts as texts } from '../../config/texts/workshop-tax.js';
import { date, number } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { LedgerHead } from './ledger-head.js';

type Quarter = OutputOf<'GET /workshop/ledger/quarters'>['items'][number];

const State = ({ quarter }: { quarter: Quarter }) => {
  if (quarter.closedAt) return <StatusMark state="ok">{texts.closed(date(quarter.closedAt))}</StatusMark>;
  return (
    <>
      <StatusMark state={quarter.isOver ? 'wait' : 'none'}>
        {quarter.isOver ? texts.open : texts.running}
      </StatusMark>
      {quarter.unclear > 0 && (
        <>
          {' '}
          <StatusMark state="warn">{texts.unclear(quarter.unclear)}</StatusMark>
        </>
      )}
    </>
  );
};

const columns: Column<Quarter>[] = [
  {
    key: 'quarter',
    header: texts.columns.quarter,
    isHeading: true,
    cell: ({ year, quarter }) => (
      <TextLink
        to={paths.workshop.quarter.to({ year: String(year), quarter: String(quarter) })}
        fontWeight="semibold"
      >
        {texts.name(year, quarter)}
      </TextLink>
    ),
  },
  { key: 'state', header: texts.columns.state, cell: (quarter) => <State quarter={quarter} /> },
  {
    key: 'receipts',
    header: texts.columns.receipts,
    isNumeric: true,
    cell: (quarter) => number(quarter.receipts),
  },
  {
    key: 'creditNotes',
    header: texts.columns.creditNotes,
    isNumeric: true,
    cell: (quarter) => number(quarter.creditNotes),
  },
];

/** Quarters with receipts: which are closed, which wait. */
export function QuartersPage() {
  const table = useTableState();
  const { page, size } = table.state;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/quarters',
    { query: { page, size } },
    { keepPreviousData: true },
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <LedgerHead title={texts.title} lead={texts.lead} isAboutTax />
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={({ year, quarter }) => `${year} ${quarter}`}
          table={table}
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
    </Band>
  );
}
