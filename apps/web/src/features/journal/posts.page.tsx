import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { journalListTexts as texts } from '../../config/texts/workshop-journal.js';
import { date } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Heading } from '../../ui/text.js';

type Row = OutputOf<'GET /workshop/posts'>['items'][number];

const columns: Column<Row>[] = [
  {
    key: 'title',
    header: texts.columns.title,
    isHeading: true,
    cell: ({ id, title }) => (
      <TextLink to={paths.workshop.post.to({ postId: id })} fontWeight="semibold">
        {title}
      </TextLink>
    ),
  },
  { key: 'audience', header: texts.columns.audience, cell: ({ audience }) => texts.audiences[audience] },
  {
    key: 'state',
    header: texts.columns.state,
    cell: ({ state }) => (
      <StatusMark state={state === 'published' ? 'ok' : 'wait'} fontWeight="normal">
        {texts.states[state]}
      </StatusMark>
    ),
  },
  { key: 'kit', header: texts.columns.kit, cell: ({ kitName }) => kitName ?? texts.noKit },
  { key: 'changed', header: texts.columns.changed, cell: ({ updatedAt }) => date(updatedAt) },
];

/** All posts, drafts too. */
export function PostsPage() {
  const table = useTableState();
  const { page, size, search } = table.state;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/posts',
    { query: { page, size, search: search || undefined } },
    { keepPreviousData: true },
  );
  const write = <LinkButton to={paths.workshop.newPost.to()}>{texts.new}</LinkButton>;
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Box display="flex" flexWrap="wrap" justifyContent="space-between" gap="4" marginBottom="6">
        <Heading level={1}>{texts.title}</Heading>
        {data?.total !== 0 && write}
      </Box>
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={({ id }) => id}
          table={table}
          searchLabel={texts.search}
          empty={
            <EmptyState title={texts.empty} action={write}>
              {texts.emptyDetail}
            </EmptyState>
          }
        />
      )}
    </Band>
  );
}
