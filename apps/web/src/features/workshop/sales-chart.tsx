import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { OutputOf } from '@windchest/contracts';
import { useState } from 'react';
import { overviewTexts as texts } from '../../config/texts/workshop-overview.js';
import { counted, date, number, price } from '../../lib/format.js';
import { useWidth } from '../../ui/drawing/use-width.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading, Text } from '../../ui/text.js';
import { barsOf, type SalesDay } from './sales-bars.js';

const Bar = chakra('rect', { base: { fill: 'ink', '&[data-shown]': { fill: 'ink.soft' } } });
const Rule = chakra('path', { base: { stroke: 'ink.soft', strokeWidth: '1' } });
const Hairline = chakra('path', { base: { stroke: 'hairline', strokeWidth: '1' } });
const Lettering = chakra('text', { base: { fill: 'ink.soft', fontSize: 'xs' } });

const heightPx = 168;
const headPx = 18;
const footPx = 22;

const columns: Column<SalesDay>[] = [
  { key: 'day', header: texts.columns.day, isHeading: true, cell: (one) => date(one.day) },
  { key: 'orders', header: texts.columns.orders, isNumeric: true, cell: (one) => number(one.orders) },
  { key: 'gross', header: texts.columns.gross, isNumeric: true, cell: (one) => price(one.gross) },
];

const orders = (count: number) => counted(count, 'order', 'orders');
const dayWords = (day: SalesDay) => texts.day(date(day.day), orders(day.orders), price(day.gross));

function summary(sales: readonly SalesDay[]): string {
  const count = sales.reduce((sum, day) => sum + day.orders, 0);
  const best = [...sales].sort((a, b) => b.gross.minor - a.gross.minor)[0];
  if (!best || count === 0) return texts.noSales;
  const gross = sales.reduce((sum, day) => sum + day.gross.minor, 0);
  return texts.salesWords(
    orders(count),
    price({ minor: gross, currency: best.gross.currency }),
    `${date(best.day)}, ${price(best.gross)}`,
  );
}

/** Sales by day as bars; the words and the table say the same. */
export function SalesChart({ sales }: { sales: NonNullable<OutputOf<'GET /workshop/overview'>['sales']> }) {
  const [ref, widthPx] = useWidth<HTMLDivElement>();
  const [shown, setShown] = useState<SalesDay>();
  const { bars, most } = barsOf(sales, { widthPx, heightPx });
  const [first, last] = [sales[0], sales.at(-1)];
  return (
    <Box as="section">
      <Heading level={2} look="subsection">
        {texts.sales}
      </Heading>
      <Text isSoft marginBottom="4" minHeight="3em">
        {shown ? dayWords(shown) : summary(sales)}
      </Text>
      <Box ref={ref}>
        {widthPx > 0 && (
          <chakra.svg
            role="img"
            aria-label={`${texts.chart}. ${summary(sales)}`}
            width={`${widthPx}px`}
            height={`${headPx + heightPx + footPx}px`}
            display="block"
            maxWidth="full"
            onPointerLeave={() => setShown(undefined)}
          >
            {most && (
              <>
                <Hairline d={`M0 ${headPx + 0.5}H${widthPx}`} />
                <Lettering x={0} y={headPx - 5}>
                  {price(most.gross)}
                </Lettering>
              </>
            )}
            {bars.map(({ day, x, slotWidth, width, height }) => (
              <g key={day.day} onPointerEnter={() => setShown(day)}>
                <rect x={x} y={headPx} width={slotWidth} height={heightPx} fill="transparent" />
                <Bar
                  data-shown={shown === day ? '' : undefined}
                  x={x + (slotWidth - width) / 2}
                  y={headPx + heightPx - height}
                  width={width}
                  height={height}
                />
              </g>
            ))}
            <Rule d={`M0 ${headPx + heightPx + 0.5}H${widthPx}`} />
            {first && last && (
              <>
                <Lettering x={0} y={headPx + heightPx + 17}>
                  {date(first.day)}
                </Lettering>
                <Lettering x={widthPx} y={headPx + heightPx + 17} textAnchor="end">
                  {date(last.day)}
                </Lettering>
              </>
            )}
          </chakra.svg>
        )}
      </Box>
      <chakra.details marginTop="4">
        <chakra.summary cursor="pointer" color="ink.soft" fontSize="sm">
          {texts.table}
        </chakra.summary>
        <HairlineTable
          caption={texts.caption}
          columns={columns}
          rows={[...sales].reverse().filter((day) => day.orders > 0)}
          rowKey={(one) => one.day}
        />
      </chakra.details>
    </Box>
  );
}
