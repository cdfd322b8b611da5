import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { supportersTexts as texts } from '../../config/texts/workshop-supporters.js';
import { monthName, number, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { SameAsTable } from '../../ui/chart/same-as-table.js';
import { TimeBars } from '../../ui/chart/time-bars.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading } from '../../ui/text.js';

type Figures = OutputOf<'GET /workshop/supporter-figures'>;
type Month = Figures['months'][number];

const columns: Column<Month>[] = [
  {
    key: 'month',
    header: texts.monthColumns.month,
    isHeading: true,
    cell: ({ month }) => monthName(month),
  },
  {
    key: 'payments',
    header: texts.monthColumns.payments,
    isNumeric: true,
    cell: ({ payments }) => number(payments),
  },
  { key: 'gross', header: texts.monthColumns.gross, isNumeric: true, cell: ({ gross }) => price(gross) },
];

const Figure = ({ value, name }: { value: string; name: string }) => (
  <Box display="flex" flexDirection="column-reverse">
    <Box as="dt" textStyle="label">
      {name}
    </Box>
    <Box as="dd" fontSize="3xl" fontWeight="semibold" lineHeight="1.2">
      {value}
    </Box>
  </Box>
);

function summary(months: readonly Month[], currency: string): string {
  const payments = months.reduce((sum, month) => sum + month.payments, 0);
  if (payments === 0) return texts.noMonths;
  const minor = months.reduce((sum, month) => sum + month.gross.minor, 0);
  return texts.monthsWords(price({ minor, currency }), texts.payments(payments));
}

/** How many supporters there are, what they bring in, and how that came about. */
export function SupporterFigures() {
  const { data, fault, mutate } = useEndpoint('GET /workshop/supporter-figures');
  if (fault && !data)
    return <Fault level={2} what={texts.figuresFailed} fault={fault} onAgain={() => void mutate()} />;
  if (!data) return <SkeletonLines lines={5} />;
  const { months, monthly } = data;
  const [first, last] = [months[0], months.at(-1)];
  return (
    <Box
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: '18rem minmax(0, 1fr)' }}
      columnGap="12"
      rowGap="8"
      marginBottom="10"
    >
      <Box
        as="dl"
        display="grid"
        gridTemplateColumns={{ base: 'repeat(2, minmax(0, 1fr))' }}
        gap="5"
        alignContent="start"
      >
        <Figure value={number(data.current)} name={texts.current} />
        <Figure value={price(monthly)} name={texts.monthly} />
        <Figure value={number(data.grace)} name={texts.grace} />
        <Figure value={number(data.paused)} name={texts.paused} />
      </Box>
      <Box as="section" minWidth="0">
        <Heading level={2} look="subsection">
          {texts.chartTitle}
        </Heading>
        <TimeBars
          label={texts.chart}
          summary={summary(months, monthly.currency)}
          heightPx={96}
          bars={months.map(({ month, payments, gross }) => ({
            key: month,
            parts: [gross.minor],
            words: texts.month(monthName(month), texts.payments(payments), price(gross)),
          }))}
          topText={({ parts: [minor = 0] }) => price({ minor, currency: monthly.currency })}
          ends={first && last && [monthName(first.month), monthName(last.month)]}
        />
        <SameAsTable>
          <HairlineTable
            caption={texts.chart}
            columns={columns}
            rows={[...months].reverse().filter(({ payments }) => payments > 0)}
            rowKey={({ month }) => month}
          />
        </SameAsTable>
      </Box>
    </Box>
  );
}
