import { Box } from '@chakra-ui/react/box';
import type { Coupon } from '@windchest/contracts';
import { useState } from 'react';
import { paths } from '../../config/paths.js';
import { couponsTexts as texts } from '../../config/texts/workshop-coupons.js';
import { price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
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
import { offWords, standingOf, windowWords } from './coupon-words.js';

const placesWords = ({ redeemed, cap, held, left }: Coupon): string =>
  [
    cap === null ? texts.redeemed(redeemed) : texts.redeemedOf(redeemed, cap),
    held > 0 && texts.held(held),
    left !== null && texts.left(left),
  ]
    .filter(Boolean)
    .join(', ');

const Standing = ({ coupon }: { coupon: Coupon }) => {
  const [now] = useState(() => new Date());
  const standing = standingOf(coupon, now);
  return (
    <StatusMark state={standing === 'active' ? 'ok' : 'none'} fontWeight="normal">
      {texts.states[standing]}
    </StatusMark>
  );
};

const columns: Column<Coupon>[] = [
  {
    key: 'code',
    header: texts.columns.code,
    isHeading: true,
    cell: (coupon) => (
      <Box lineHeight="1.4">
        <TextLink to={paths.workshop.coupon.to({ couponId: coupon.id })} fontWeight="semibold">
          {coupon.code}
        </TextLink>
        <Box color="ink.soft" fontWeight="normal">
          {coupon.label}
        </Box>
      </Box>
    ),
  },
  { key: 'off', header: texts.columns.off, cell: offWords },
  {
    key: 'kits',
    header: texts.columns.kits,
    cell: ({ kits }) => (kits.length ? kits.map((kit) => kit.name).join(', ') : texts.allKits),
  },
  { key: 'window', header: texts.columns.window, cell: windowWords },
  { key: 'places', header: texts.columns.places, cell: placesWords },
  {
    key: 'takenOff',
    header: texts.columns.takenOff,
    isNumeric: true,
    cell: ({ takenOff }) => price(takenOff),
  },
  { key: 'state', header: texts.columns.state, cell: (coupon) => <Standing coupon={coupon} /> },
];

/** Every code, with what is held, redeemed and left of it. */
export function CouponsPage() {
  const { may } = useSession();
  const table = useTableState();
  const { page, size, search } = table.state;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/coupons',
    { query: { page, size, search: search || undefined } },
    { keepPreviousData: true, refreshInterval: 15_000 },
  );
  const makeLink = may('coupons:write') && (
    <LinkButton to={paths.workshop.newCoupon.to()}>{texts.new}</LinkButton>
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Box display="flex" flexWrap="wrap" justifyContent="space-between" gap="4" marginBottom="6">
        <Heading level={1}>{texts.title}</Heading>
        {data?.total !== 0 && makeLink}
      </Box>
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(coupon) => coupon.id}
          table={table}
          searchLabel={texts.search}
          empty={
            <EmptyState title={texts.empty} action={makeLink}>
              {texts.emptyDetail}
            </EmptyState>
          }
        />
      )}
    </Band>
  );
}
