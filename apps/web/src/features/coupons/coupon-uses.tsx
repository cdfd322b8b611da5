import { Box } from '@chakra-ui/react/box';
import type { Coupon } from '@windchest/contracts';
import { useState } from 'react';
import { couponUsesTexts as texts } from '../../config/texts/workshop-coupons.js';
import { number, price } from '../../lib/format.js';
import { day } from '../../lib/workshop-format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { SameAsTable } from '../../ui/chart/same-as-table.js';
import { type Series, TimeBars } from '../../ui/chart/time-bars.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading, Text } from '../../ui/text.js';
import { type Step, type UsesBar, usesOverTime } from './uses-over-time.js';

const series: readonly Series[] = [
  { name: texts.redeemed, fill: 'solid' },
  { name: texts.held, fill: 'hatched' },
  { name: texts.givenBack, fill: 'open' },
];

const columnsFor = (step: Step, currency: string): Column<UsesBar>[] => [
  { key: 'from', header: texts.steps[step], isHeading: true, cell: (bar) => day(bar.from) },
  { key: 'redeemed', header: texts.redeemed, isNumeric: true, cell: (bar) => number(bar.redeemed) },
  { key: 'held', header: texts.held, isNumeric: true, cell: (bar) => number(bar.held) },
  { key: 'givenBack', header: texts.givenBack, isNumeric: true, cell: (bar) => number(bar.givenBack) },
  {
    key: 'takenOff',
    header: texts.takenOff,
    isNumeric: true,
    cell: (bar) => price({ minor: bar.takenOffMinor, currency }),
  },
];

const takenIn = ({ redeemed, held, givenBack }: UsesBar) => redeemed + held + givenBack;

/** The places of a coupon by when they were taken and what became of them. */
export function CouponUses({ coupon }: { coupon: Coupon }) {
  const [today] = useState(() => new Date().toISOString().slice(0, 10));
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/coupons/:couponId/uses',
    { params: { couponId: coupon.id } },
    { refreshInterval: 15_000 },
  );
  const { step, bars } = usesOverTime(data ?? [], today);
  const [first, last] = [bars[0], bars.at(-1)];
  const total = (key: 'redeemed' | 'held' | 'givenBack') => bars.reduce((sum, bar) => sum + bar[key], 0);
  return (
    <Box as="section">
      <Heading level={2} look="subsection" marginBottom="2">
        {texts.title}
      </Heading>
      {!data ? (
        fault ? (
          <Fault fault={fault} onAgain={() => void mutate()} level={3} />
        ) : (
          <SkeletonLines lines={4} />
        )
      ) : bars.length === 0 ? (
        <Text isSoft>{texts.none}</Text>
      ) : (
        <>
          <TimeBars
            label={texts.chart[step]}
            summary={texts.summary(total('redeemed'), total('held'), total('givenBack'))}
            series={series}
            bars={bars.map((bar) => ({
              key: bar.from,
              parts: [bar.redeemed, bar.held, bar.givenBack],
              words: texts.bar[step](day(bar.from), bar.redeemed, bar.held, bar.givenBack),
            }))}
            topText={({ parts }) => texts.taken(parts.reduce((sum, part) => sum + part, 0))}
            ends={first && last && [day(first.from), day(last.from)]}
            heightPx={120}
          />
          <SameAsTable>
            <HairlineTable
              caption={texts.caption}
              columns={columnsFor(step, coupon.takenOff.currency)}
              rows={[...bars].reverse().filter((bar) => takenIn(bar) > 0)}
              rowKey={(bar) => bar.from}
            />
          </SameAsTable>
        </>
      )}
    </Box>
  );
}
