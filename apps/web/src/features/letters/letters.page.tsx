import { Box } from '@chakra-ui/react/box';
import type { Letter, OutputOf } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { lettersTexts as texts } from '../../config/texts/workshop-letters.js';
import { date, number } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Heading, Text } from '../../ui/text.js';
import { letterSigns } from './letter-signs.js';

type Row = OutputOf<'GET /workshop/letters'>['items'][number];
type State = Letter['state'];

const columns: Column<Row>[] = [
  {
    key: 'subject',
    header: texts.columns.subject,
    isHeading: true,
    cell: ({ id, subject }) => (
      <TextLink to={paths.workshop.letter.to({ letterId: id })} fontWeight="semibold">
        {subject}
      </TextLink>
    ),
  },
  { key: 'kind', header: texts.columns.kind, cell: ({ kind }) => texts.kinds[kind] },
  { key: 'kit', header: texts.columns.kit, cell: ({ kitName }) => kitName ?? texts.noKit },
  {
    key: 'state',
    header: texts.columns.state,
    cell: ({ state }) => (
      <StatusMark state={letterSigns[state]} fontWeight="normal">
        {texts.states[state]}
      </StatusMark>
    ),
  },
  {
    key: 'reached',
    header: texts.columns.reached,
    isNumeric: true,
    cell: ({ state, counts }) =>
      state === 'draft' || state === 'scheduled'
        ? texts.noKit
        : number(counts.sent + counts.handedOver + counts.bounced),
  },
  { key: 'changed', header: texts.columns.changed, cell: ({ updatedAt }) => date(updatedAt) },
];

const isState = (text: string | undefined): text is State => text !== undefined && text in texts.states;

/** All letters: drafts, those on their way, those sent. */
export function LettersPage() {
  const { may } = useSession();
  const table = useTableState();
  const { page, size, search } = table.state;
  const state = isState(table.filters['state']) ? table.filters['state'] : undefined;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/letters',
    { query: { page, size, search: search || undefined, state } },
    {
      keepPreviousData: true,
      refreshInterval: (answer) => (answer?.items.some((one) => one.state === 'sending') ? 3000 : 0),
    },
  );
  const write = may('letters:write') && (
    <LinkButton to={paths.workshop.newLetter.to()}>{texts.new}</LinkButton>
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Box display="flex" flexWrap="wrap" justifyContent="space-between" gap="4" marginBottom="6">
        <Box>
          <Heading level={1}>{texts.title}</Heading>
          <Text look="lead" marginTop="2">
            {texts.lead}
          </Text>
          <Text look="small" marginTop="2">
            <TextLink to={paths.workshop.deadAddresses.to()}>{texts.deadAddresses}</TextLink>
          </Text>
        </Box>
        {data?.total !== 0 && <Box>{write}</Box>}
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
          empty={
            <EmptyState title={texts.empty} action={write || undefined}>
              {texts.emptyDetail}
            </EmptyState>
          }
        />
      )}
    </Band>
  );
}
