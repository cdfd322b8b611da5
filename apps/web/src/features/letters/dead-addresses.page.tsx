import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { useState } from 'react';
import { paths } from '../../config/paths.js';
import { deadTexts as texts, lettersTexts } from '../../config/texts/workshop-letters.js';
import { date } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Heading, Text } from '../../ui/text.js';

type Row = OutputOf<'GET /workshop/dead-addresses'>['items'][number];

/** Addresses that get no letters, why, and how to write to one again. */
export function DeadAddressesPage() {
  const { may } = useSession();
  const table = useTableState();
  const { page, size, search } = table.state;
  const [asked, setAsked] = useState<Row>();
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/dead-addresses',
    { query: { page, size, search: search || undefined } },
    { keepPreviousData: true },
  );
  const lift = useAction('DELETE /workshop/dead-addresses/:addressId', ['GET /workshop/dead-addresses']);
  const columns: Column<Row>[] = [
    {
      key: 'email',
      header: texts.columns.email,
      isHeading: true,
      cell: ({ email }) => <Box overflowWrap="anywhere">{email}</Box>,
    },
    { key: 'reason', header: texts.columns.reason, cell: ({ reason }) => reason },
    { key: 'since', header: texts.columns.since, cell: ({ since }) => date(since) },
    ...(may('letters:send')
      ? [
          {
            key: 'act',
            header: texts.columns.act,
            cell: (row: Row) => (
              <Button
                look="outline"
                size="sm"
                aria-label={texts.liftFor(row.email)}
                onClick={() => setAsked(row)}
              >
                {texts.lift}
              </Button>
            ),
          },
        ]
      : []),
  ];
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Text isSoft>
        <TextLink to={paths.workshop.letters.to()}>{lettersTexts.title}</TextLink>
      </Text>
      <Heading level={1}>{texts.title}</Heading>
      <Text look="lead" marginTop="2" marginBottom="6">
        {texts.lead}
      </Text>
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
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
      {asked && (
        <ConfirmDialog
          isOpen
          onClose={() => setAsked(undefined)}
          title={texts.ask(asked.email)}
          confirmLabel={texts.lift}
          look="ink"
          onConfirm={async () => (await lift.run({ params: { addressId: asked.id } })).isDone}
        >
          <Text>{texts.what}</Text>
          {lift.fault && <Fault what={texts.failed} fault={lift.fault} />}
        </ConfirmDialog>
      )}
    </Band>
  );
}
