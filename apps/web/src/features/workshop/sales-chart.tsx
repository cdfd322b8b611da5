import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { overviewTexts as texts } from '../../config/texts/workshop-overview.js';
import { counted, number, price } from '../../lib/format.js';
import { day as isoDay } from '../../lib/workshop-format.js';
import { SameAsTable } from '../../ui/chart/same-as-table.js';
import { TimeBars } from '../../ui/chart/time-bars.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading } from '../../ui/text.js';

type SalesDay = NonNullable<OutputOf<'GET /workshop/overview'>['sales']>[number];

const columns: Column<SalesDay>[] = [
  { key: 'day', header: texts.columns.day, isHeading: true, cell: (one) => isoDay(one.day) },
  { key: 'orders', header: texts.columns.orders, isNumeric: true, cell: (one) => number(one.orders) },
  { key: 'gross', header: texts.columns.gross, isNumeric: true, cell: (one) => price(one.gross) },
];

const orders = (count: number) => counted(count, 'order', 'orders');

function summary(sales: readonly SalesDay[]): string {
  const count = sales.reduce((sum, day) => sum + day.orders, 0);
  const best = [...sales].sort((a, b) => b.gross.minor - a.gross.minor)[0];
  if (!best || count === 0) return texts.noSales;
  const gross = sales.reduce((sum, day) => sum + day.gross.minor, 0);
  return texts.salesWords(
    orders(count),
    price({ minor: gross, currency: best.gross.currency }),
    `${isoDay(best.day)}, ${price(best.gross)}`,
  );
}

/** Sales by day as bars; the words and the table say the same. */
export function SalesChart({ sales }: { sales: readonly SalesDay[] }) {
  const [first, last] = [sales[0], sales.at(-1)];
  const currency = first?.gross.currency ?? 'EUR';
  return (
    <Box as="section">
      <Heading level={2} look="subsection">
        {texts.sales}
      </Heading>
      <TimeBars
        label={texts.chart}
        summary={summary(sales)}
        bars={sales.map((day) => ({
          key: day.day,
          parts: [day.gross.minor],
          words: texts.day(isoDay(day.day), orders(day.orders), price(day.gross)),
        }))}
        topText={({ parts: [minor = 0] }) => price({ minor, currency })}
        ends={first && last && [isoDay(first.day), isoDay(last.day)]}
      />
      <SameAsTable>
        <HairlineTable
          caption={texts.caption}
          columns={columns}
          rows={[...sales].reverse().filter((day) => day.orders > 0)}
          rowKey={(one) => one.day}
        />
      </SameAsTable>
    </Box>
  );
}
