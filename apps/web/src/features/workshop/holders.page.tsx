import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { holdersTexts as texts } from '../../config/texts/workshop-people.js';
import { date, number } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import type { SignName } from '../../ui/sign.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Heading } from '../../ui/text.js';

type Holder = OutputOf<'GET /workshop/holders'>['items'][number];

const signs: Record<Holder['state'], SignName> = { active: 'ok', suspended: 'warn', ended: 'none' };

const columns: Column<Holder>[] = [
  { key: 'email', header: texts.columns.email, isHeading: true, cell: (one) => one.email },
  { key: 'kit', header: texts.columns.kit, cell: (one) => one.kitName },
  { key: 'held', header: texts.columns.held, cell: (one) => one.held ?? texts.notDownloaded },
  { key: 'source', header: texts.columns.source, cell: (one) => texts.sources[one.source] },
  {
    key: 'state',
    header: texts.columns.state,
    cell: (one) => (
      <StatusMark state={signs[one.state]} fontWeight="normal">
        {texts.states[one.state]}
      </StatusMark>
    ),
  },
  {
    key: 'downloads',
    header: texts.columns.downloads,
    isNumeric: true,
    cell: (one) => number(one.downloads),
  },
  { key: 'since', header: texts.columns.since, cell: (one) => date(one.since) },
];

/** Who is entitled to which kit, and the revision they hold. */
export function HoldersPage() {
  const table = useTableState();
  const { page, size, search } = table.state;
  const kitId = table.filters['kitId'];
  const { data: kits } = useEndpoint('GET /workshop/kits', { query: { size: 100 } });
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/holders',
    { query: { page, size, search: search || undefined, kitId } },
    { keepPreviousData: true },
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Heading level={1} marginBottom="6">
        {texts.title}
      </Heading>
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(one) => `${one.email} ${one.kitName} ${one.source} ${one.since}`}
          table={table}
          searchLabel={texts.search}
          filters={
            <Box flex="0 1 13rem">
              <SelectField
                label={texts.kit}
                emptyLabel={texts.allKits}
                value={kitId ?? ''}
                onChange={(event) => table.change({ kitId: event.target.value || undefined })}
                options={(kits?.items ?? []).map((kit) => ({ value: kit.id, label: kit.name }))}
              />
            </Box>
          }
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
    </Band>
  );
}
