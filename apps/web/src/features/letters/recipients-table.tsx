import { Box } from '@chakra-ui/react/box';
import type { LeftOutReason, Letter, OutputOf } from '@windchest/contracts';
import { useEffect } from 'react';
import { leftOutTexts, sendingTexts as texts } from '../../config/texts/workshop-letters.js';
import { apiAddress } from '../../lib/api-address.js';
import { dateTime } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { recipientSigns } from './letter-signs.js';

type Row = OutputOf<'GET /workshop/letters/:letterId/recipients'>['items'][number];

const columns: Column<Row>[] = [
  {
    key: 'email',
    header: texts.columns.email,
    isHeading: true,
    cell: ({ email }) => <Box overflowWrap="anywhere">{email}</Box>,
  },
  { key: 'name', header: texts.columns.name, cell: ({ name }) => name || texts.nothing },
  { key: 'held', header: texts.columns.held, cell: ({ held }) => held ?? texts.nothing },
  {
    key: 'state',
    header: texts.columns.state,
    cell: ({ state }) => (
      <StatusMark state={recipientSigns[state]} fontWeight="normal">
        {texts.states[state]}
      </StatusMark>
    ),
  },
  { key: 'at', header: texts.columns.at, cell: ({ sentAt }) => (sentAt ? dateTime(sentAt) : texts.nothing) },
  {
    key: 'reason',
    header: texts.columns.reason,
    cell: ({ state, reason }) => (
      <Box overflowWrap="anywhere">
        {state === 'left-out' ? leftOutTexts[reason as LeftOutReason] : (reason ?? texts.nothing)}
      </Box>
    ),
  },
];

const isState = (text: string | undefined): text is Row['state'] =>
  text !== undefined && text in texts.states;

/** What became of each recipient. */
export function RecipientsTable({ letter }: { letter: Letter }) {
  const table = useTableState();
  const { page, size, search } = table.state;
  const state = isState(table.filters['state']) ? table.filters['state'] : undefined;
  const params = { letterId: letter.id };
  const narrowing = { state, search: search || undefined };
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/letters/:letterId/recipients',
    { params, query: { ...narrowing, page, size } },
    { keepPreviousData: true, refreshInterval: letter.state === 'sending' ? 2000 : 0 },
  );
  // The letter's own figures are asked for more often; where they move, the rows have moved too.
  const figures = JSON.stringify(letter.counts);
  useEffect(() => void mutate(), [figures, mutate]);
  if (fault && !data) return <Fault fault={fault} onAgain={() => void mutate()} level={3} />;
  return (
    <DataTable
      caption={texts.caption}
      columns={columns}
      answer={data}
      rowKey={({ id }) => id}
      table={table}
      searchLabel={texts.search}
      filters={
        <Box flex="0 1 13rem">
          <SelectField
            label={texts.state}
            emptyLabel={texts.allStates}
            value={state ?? ''}
            onChange={(event) => table.change({ state: event.target.value || undefined })}
            options={Object.entries(texts.states).map(([value, label]) => ({ value, label }))}
          />
        </Box>
      }
      csvHref={apiAddress('GET /workshop/letters/:letterId/recipients.csv', { params, query: narrowing })}
      empty={
        <EmptyState title={texts.empty} level={3}>
          {texts.emptyDetail}
        </EmptyState>
      }
    />
  );
}
