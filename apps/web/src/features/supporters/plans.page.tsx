import { Box } from '@chakra-ui/react/box';
import type { WorkshopPlan } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { plansTexts as texts } from '../../config/texts/workshop-supporters.js';
import { number, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { Band } from '../../ui/sheet.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { SupportersHead } from './supporters-head.js';

const columns: Column<WorkshopPlan>[] = [
  {
    key: 'name',
    header: texts.columns.name,
    isHeading: true,
    cell: (plan) => (
      <TextLink to={paths.workshop.plan.to({ planId: plan.id })} fontWeight="semibold">
        {plan.name}
      </TextLink>
    ),
  },
  {
    key: 'kits',
    header: texts.columns.kits,
    cell: ({ hasAllKits, kits }) => (hasAllKits ? texts.allKits : kits.map((kit) => kit.name).join(', ')),
  },
  {
    key: 'state',
    header: texts.columns.state,
    cell: ({ isOffered }) => (
      <StatusMark state={isOffered ? 'ok' : 'none'} fontWeight="normal">
        {isOffered ? texts.offered : texts.notOffered}
      </StatusMark>
    ),
  },
  {
    key: 'supporters',
    header: texts.columns.supporters,
    isNumeric: true,
    cell: ({ supporters }) => number(supporters),
  },
  { key: 'amount', header: texts.columns.amount, isNumeric: true, cell: ({ amount }) => price(amount) },
  { key: 'monthly', header: texts.columns.monthly, isNumeric: true, cell: ({ monthly }) => price(monthly) },
];

/** What one can pledge to, and what each plan brings in. */
export function PlansPage() {
  const { may } = useSession();
  const table = useTableState();
  const { page, size, search } = table.state;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/plans',
    { query: { page, size, search: search || undefined } },
    { keepPreviousData: true },
  );
  const makeLink = may('plans:write') && (
    <LinkButton to={paths.workshop.newPlan.to()}>{texts.new}</LinkButton>
  );
  return (
    <Band>
      <SupportersHead action={data?.total !== 0 && makeLink} />
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <Box>
          <DataTable
            caption={texts.caption}
            columns={columns}
            answer={data}
            rowKey={(plan) => plan.id}
            table={table}
            searchLabel={texts.search}
            empty={
              <EmptyState title={texts.empty} action={makeLink}>
                {texts.emptyDetail}
              </EmptyState>
            }
          />
        </Box>
      )}
    </Band>
  );
}
