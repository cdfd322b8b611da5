import { Box } from '@chakra-ui/react/box';
import type { InputOf, PledgeState, SupporterRow } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { pledgeStateTexts } from '../../config/texts/pledge.js';
import { supportersTexts as texts } from '../../config/texts/workshop-supporters.js';
import { apiAddress } from '../../lib/api-address.js';
import { date, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextLink } from '../../ui/link.js';
import { Band } from '../../ui/sheet.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Unbroken } from '../../ui/unbroken.js';
import { OrderFlags } from '../ledger/order-flags.js';
import { pledgeSigns } from './pledge-words.js';
import { SupporterFigures } from './supporter-figures.js';
import { SupportersHead } from './supporters-head.js';

type Query = NonNullable<InputOf<'GET /workshop/supporters'>['query']>;

const nextWords = ({ endsAt, endedAt, nextPaymentAt }: SupporterRow): string => {
  if (endedAt) return texts.endedOn(date(endedAt));
  if (endsAt) return texts.endsOn(date(endsAt));
  return nextPaymentAt ? date(nextPaymentAt) : texts.none;
};

const columns: Column<SupporterRow>[] = [
  {
    key: 'name',
    header: texts.columns.name,
    isHeading: true,
    cell: (one) => (
      <Box lineHeight="1.4">
        <TextLink to={paths.workshop.supporter.to({ pledgeId: one.id })} fontWeight="semibold">
          {one.name || one.email || texts.none}
        </TextLink>
        <Box color="ink.soft" fontWeight="normal" overflowWrap="anywhere">
          {one.email}
        </Box>
      </Box>
    ),
  },
  {
    key: 'plan',
    header: texts.columns.plan,
    cell: (one) => (
      <Box lineHeight="1.4">
        <Box>{one.plan.name}</Box>
        <Box color="ink.soft">{one.country}</Box>
      </Box>
    ),
  },
  {
    key: 'state',
    header: texts.columns.state,
    cell: (one) => (
      <Box>
        <StatusMark state={pledgeSigns[one.state]} fontWeight="normal">
          {pledgeStateTexts[one.state]}
        </StatusMark>
        <OrderFlags flags={one.flags} />
      </Box>
    ),
  },
  {
    key: 'beganAt',
    header: texts.columns.beganAt,
    isSortable: true,
    cell: (one) => <Unbroken>{one.beganAt ? date(one.beganAt) : texts.none}</Unbroken>,
  },
  {
    key: 'nextPaymentAt',
    header: texts.columns.nextPaymentAt,
    isSortable: true,
    cell: (one) => <Unbroken>{nextWords(one)}</Unbroken>,
  },
  {
    key: 'amount',
    header: texts.columns.amount,
    isNumeric: true,
    isSortable: true,
    cell: (one) => <Unbroken>{price(one.amount)}</Unbroken>,
  },
  {
    key: 'paid',
    header: texts.columns.paid,
    isNumeric: true,
    cell: (one) => <Unbroken>{price(one.paid)}</Unbroken>,
  },
];

const { opening: _never, ...shownStates } = pledgeStateTexts;
const isState = (text: string | undefined): text is PledgeState => text !== undefined && text in shownStates;
const defaults = { sort: 'beganAt', order: 'desc' } as const;
const isSorting = (text: string | undefined): text is NonNullable<Query['sort']> =>
  text === 'beganAt' || text === 'amount' || text === 'nextPaymentAt';

/** Who pledges, how they stand, and what that brings in. */
export function SupportersPage() {
  const table = useTableState(defaults);
  const { page, size, search, sort, order } = table.state;
  const state = isState(table.filters['state']) ? table.filters['state'] : undefined;
  const flagged = table.filters['flagged'] === '1' ? ('1' as const) : undefined;
  const planId = table.filters['planId'] || undefined;
  const narrowing = { state, planId, flagged, search: search || undefined };
  const plans = useEndpoint('GET /workshop/plans', { query: { size: 100 } });
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/supporters',
    { query: { ...narrowing, page, size, order, sort: isSorting(sort) ? sort : 'beganAt' } },
    { keepPreviousData: true },
  );
  return (
    <Band>
      <SupportersHead />
      {data?.total !== 0 || table.isNarrowed ? <SupporterFigures /> : null}
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(one) => one.id}
          table={table}
          searchLabel={texts.search}
          filters={
            <>
              <Box flex="0 1 11rem">
                <SelectField
                  label={texts.state}
                  emptyLabel={texts.allStates}
                  value={state ?? ''}
                  onChange={(event) => table.change({ state: event.target.value || undefined })}
                  options={Object.entries(shownStates).map(([value, label]) => ({ value, label }))}
                />
              </Box>
              <Box flex="0 1 13rem">
                <SelectField
                  label={texts.plan}
                  emptyLabel={texts.allPlans}
                  value={planId ?? ''}
                  onChange={(event) => table.change({ planId: event.target.value || undefined })}
                  options={(plans.data?.items ?? []).map(({ id, name }) => ({ value: id, label: name }))}
                />
              </Box>
              <Box paddingBottom="2.5">
                <Checkbox
                  label={texts.flaggedOnly}
                  checked={flagged === '1'}
                  onChange={(event) => table.change({ flagged: event.target.checked ? '1' : undefined })}
                />
              </Box>
            </>
          }
          csvHref={apiAddress('GET /workshop/supporters.csv', { query: narrowing })}
          empty={
            <EmptyState
              title={texts.empty}
              action={<LinkButton to={paths.workshop.plans.to()}>{texts.toPlans}</LinkButton>}
            >
              {texts.emptyDetail}
            </EmptyState>
          }
        />
      )}
    </Band>
  );
}
