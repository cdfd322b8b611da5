import { Box } from '@chakra-ui/react/box';
import type { Reconciliation } from '@windchest/contracts';
import { type FormEvent, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { ledgerTexts, reconciliationTexts as texts } from '../../config/texts/workshop-ledger.js';
import { dateTime } from '../../lib/format.js';
import { day } from '../../lib/workshop-format.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Unbroken } from '../../ui/unbroken.js';
import { isUnderWay, workSigns } from './exports.page.js';
import { LedgerHead } from './ledger-head.js';
import { lastMonth } from './last-month.js';

export const spanWords = ({ from, to }: Pick<Reconciliation, 'from' | 'to'>) =>
  texts.spanOf(day(from), day(to));

const Differences = ({ one }: { one: Reconciliation }) => {
  if (one.differences === null) return ledgerTexts.none;
  return one.differences === 0 ? (
    <StatusMark state="ok">{texts.agreed}</StatusMark>
  ) : (
    <StatusMark state="warn">{one.differences}</StatusMark>
  );
};

const columns: Column<Reconciliation>[] = [
  {
    key: 'span',
    header: texts.columns.span,
    isHeading: true,
    cell: (one) => (
      <TextLink to={paths.workshop.reconciliation.to({ reconciliationId: one.id })} fontWeight="semibold">
        {spanWords(one)}
      </TextLink>
    ),
  },
  {
    key: 'state',
    header: texts.columns.state,
    cell: (one) => <StatusMark state={workSigns[one.state]}>{texts.states[one.state]}</StatusMark>,
  },
  { key: 'differences', header: texts.columns.differences, cell: (one) => <Differences one={one} /> },
  { key: 'by', header: texts.columns.by, cell: (one) => one.askedBy },
  {
    key: 'asked',
    header: texts.columns.asked,
    cell: (one) => <Unbroken>{dateTime(one.createdAt)}</Unbroken>,
  },
];

function AskToCompare() {
  const navigate = useNavigate();
  const [span, setSpan] = useState(() => lastMonth(new Date()));
  const { run, fault, isRunning } = useAction('POST /workshop/ledger/reconciliations', [
    'GET /workshop/ledger/reconciliations',
  ]);
  const ask = async (event: FormEvent) => {
    event.preventDefault();
    const outcome = await run({ body: span });
    if (outcome.isDone)
      await navigate(paths.workshop.reconciliation.to({ reconciliationId: outcome.data.id }));
  };
  const field = (key: 'from' | 'to') => (
    <Box flex="0 1 11rem">
      <TextField
        label={texts[key]}
        type="date"
        required
        value={span[key]}
        error={fault?.fields[key]}
        onChange={(event) => setSpan({ ...span, [key]: event.target.value })}
      />
    </Box>
  );
  return (
    <Box as="form" onSubmit={ask} marginBottom="8">
      <Box display="flex" flexWrap="wrap" alignItems="flex-end" gap="3">
        {field('from')}
        {field('to')}
        <Button type="submit" isBusy={isRunning} busyWords={texts.asking}>
          {texts.ask}
        </Button>
      </Box>
      {fault && Object.keys(fault.fields).length === 0 && <Fault what={texts.failed} fault={fault} />}
    </Box>
  );
}

/** Comparisons with the payment service, and a new one. */
export function ReconciliationsPage() {
  const table = useTableState();
  const { page, size } = table.state;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/reconciliations',
    { query: { page, size } },
    {
      keepPreviousData: true,
      refreshInterval: (answer) => (answer?.items.some(isUnderWay) ? 1500 : 0),
    },
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <LedgerHead title={texts.title} lead={texts.lead} />
      <AskToCompare />
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(one) => one.id}
          table={table}
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
    </Band>
  );
}
