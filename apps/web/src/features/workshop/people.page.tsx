import { Box } from '@chakra-ui/react/box';
import type { OutputOf, Role } from '@windchest/contracts';
import { lazy, Suspense, useState } from 'react';
import { workshopTexts } from '../../config/texts/workshop.js';
import { peopleTexts as texts } from '../../config/texts/workshop-people.js';
import { date } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { ChangeRole } from './change-role.js';
import { PeopleHead } from './people-head.js';

const InviteDialog = lazy(async () => ({ default: (await import('./invite-dialog.js')).InviteDialog }));

type PersonRow = OutputOf<'GET /workshop/people'>['items'][number];

const columns: Column<PersonRow>[] = [
  { key: 'name', header: texts.columns.name, isHeading: true, cell: (one) => one.name },
  { key: 'email', header: texts.columns.email, cell: (one) => one.email },
  { key: 'role', header: texts.columns.role, cell: (one) => workshopTexts.roles[one.role] },
  {
    key: 'verified',
    header: texts.columns.verified,
    cell: (one) => (
      <StatusMark state={one.isVerified ? 'ok' : 'wait'} fontWeight="normal">
        {one.isVerified ? texts.verified : texts.notVerified}
      </StatusMark>
    ),
  },
  { key: 'joined', header: texts.columns.joined, cell: (one) => date(one.joinedAt) },
];

const isRole = (text: string | undefined): text is Role => text !== undefined && text in workshopTexts.roles;

/** Everybody with an account, and who of them works here. */
export function PeoplePage() {
  const { may } = useSession();
  const table = useTableState();
  const [isInviting, setIsInviting] = useState(false);
  const [invited, setInvited] = useState<string>();
  const { page, size, search } = table.state;
  const role = isRole(table.filters['role']) ? table.filters['role'] : undefined;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/people',
    { query: { page, size, search: search || undefined, role } },
    { keepPreviousData: true },
  );
  const mayWrite = may('people:write');
  return (
    <Band>
      <PageTitle title={texts.title} />
      <PeopleHead
        title={texts.title}
        action={mayWrite && <Button onClick={() => setIsInviting(true)}>{texts.invite}</Button>}
      />
      {invited && (
        <Box marginBottom="5">
          <Notice tone="ok" isNews>
            {texts.invited(invited)}
          </Notice>
        </Box>
      )}
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={
            mayWrite
              ? [
                  ...columns,
                  {
                    key: 'change',
                    header: texts.columns.change,
                    cell: (one) => <ChangeRole person={one} />,
                  },
                ]
              : columns
          }
          answer={data}
          rowKey={(one) => one.id}
          table={table}
          searchLabel={texts.search}
          filters={
            <Box flex="0 1 12rem">
              <SelectField
                label={texts.role}
                emptyLabel={texts.allRoles}
                value={role ?? ''}
                onChange={(event) => table.change({ role: event.target.value || undefined })}
                options={Object.entries(workshopTexts.roles).map(([value, label]) => ({ value, label }))}
              />
            </Box>
          }
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
      {isInviting && (
        <Suspense>
          <InviteDialog onClose={() => setIsInviting(false)} onInvited={setInvited} />
        </Suspense>
      )}
    </Band>
  );
}
