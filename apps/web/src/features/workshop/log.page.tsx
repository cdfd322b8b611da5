import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { logTexts as texts } from '../../config/texts/workshop-people.js';
import { dateTime } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { LogChangeList } from './log-change-list.js';
import { PeopleHead } from './people-head.js';

type Entry = OutputOf<'GET /workshop/log'>['items'][number];

const columns: Column<Entry>[] = [
  {
    key: 'what',
    header: texts.columns.what,
    isHeading: true,
    cell: (entry) => (
      <Box as="span" fontWeight="semibold">
        {entry.what}
      </Box>
    ),
  },
  { key: 'subject', header: texts.columns.subject, cell: (entry) => entry.subject },
  { key: 'who', header: texts.columns.who, cell: (entry) => entry.who },
  {
    key: 'at',
    header: texts.columns.at,
    cell: (entry) => (
      <Box as="time" whiteSpace="nowrap">
        {dateTime(entry.at)}
      </Box>
    ),
  },
  {
    key: 'changes',
    header: texts.columns.changes,
    width: '34%',
    cell: (entry) => <LogChangeList before={entry.before} after={entry.after} />,
  },
];

/** Every change by staff: who, what, when, before and after. */
export function LogPage() {
  const table = useTableState();
  const { page, size, search } = table.state;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/log',
    { query: { page, size, search: search || undefined } },
    { keepPreviousData: true },
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <PeopleHead title={texts.title} />
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(entry) => entry.id}
          table={table}
          searchLabel={texts.search}
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
    </Band>
  );
}
