import { Box } from '@chakra-ui/react/box';
import type { SalesFigures } from '@windchest/contracts';
import { useSearchParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { salesTexts as texts } from '../../config/texts/workshop-ledger.js';
import { counted, number, price } from '../../lib/format.js';
import { countryName, month } from '../../lib/workshop-format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { BarList } from '../../ui/chart/bar-list.js';
import { SameAsTable } from '../../ui/chart/same-as-table.js';
import { TimeBars } from '../../ui/chart/time-bars.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading, Text } from '../../ui/text.js';
import { Unbroken } from '../../ui/unbroken.js';
import { LedgerHead } from './ledger-head.js';

type Month = SalesFigures['months'][number];
type Country = SalesFigures['countries'][number];
type Kit = SalesFigures['kits'][number];
type Amount = Month['gross'];

const orders = (count: number) => counted(count, 'order', 'orders');
const amount = (value: Amount) => <Unbroken>{price(value)}</Unbroken>;
const spans = Object.keys(texts.spans).map(Number);

const monthColumns: Column<Month>[] = [
  { key: 'month', header: texts.monthColumns.month, isHeading: true, cell: (one) => month(one.month) },
  { key: 'orders', header: texts.monthColumns.orders, isNumeric: true, cell: (one) => number(one.orders) },
  { key: 'gross', header: texts.monthColumns.gross, isNumeric: true, cell: (one) => amount(one.gross) },
  {
    key: 'refunded',
    header: texts.monthColumns.refunded,
    isNumeric: true,
    cell: (one) => amount(one.refunded),
  },
];
const countryColumns: [Column<Country>, ...Column<Country>[]] = [
  {
    key: 'country',
    header: texts.countryColumns.country,
    isHeading: true,
    cell: (one) => countryName(one.country),
  },
  { key: 'orders', header: texts.countryColumns.orders, isNumeric: true, cell: (one) => number(one.orders) },
  { key: 'gross', header: texts.countryColumns.gross, isNumeric: true, cell: (one) => amount(one.gross) },
];
const kitColumns: [Column<Kit>, ...Column<Kit>[]] = [
  {
    key: 'kit',
    header: texts.kitColumns.kit,
    isHeading: true,
    cell: (one) => <TextLink to={paths.workshop.kit.to({ kitId: one.kitId })}>{one.name}</TextLink>,
  },
  { key: 'sold', header: texts.kitColumns.sold, isNumeric: true, cell: (one) => number(one.sold) },
  { key: 'gross', header: texts.kitColumns.gross, isNumeric: true, cell: (one) => amount(one.gross) },
];

const sumOf = (months: readonly Month[], key: 'gross' | 'refunded'): Amount => ({
  minor: months.reduce((sum, one) => sum + one[key].minor, 0),
  currency: months[0]?.[key].currency ?? 'EUR',
});

function Months({ months }: { months: readonly Month[] }) {
  const count = months.reduce((sum, one) => sum + one.orders, 0);
  const [first, last] = [months[0], months.at(-1)];
  return (
    <Box as="section">
      <Heading level={2} look="subsection">
        {texts.byMonth}
      </Heading>
      <TimeBars
        label={texts.chart}
        summary={
          count === 0
            ? texts.none
            : texts.summary(orders(count), price(sumOf(months, 'gross')), price(sumOf(months, 'refunded')))
        }
        bars={months.map((one) => ({
          key: one.month,
          parts: [one.gross.minor],
          words: texts.month(month(one.month), orders(one.orders), price(one.gross)),
        }))}
        topText={({ parts: [minor = 0] }) => price({ minor, currency: first?.gross.currency ?? 'EUR' })}
        ends={first && last && [month(first.month), month(last.month)]}
      />
      <SameAsTable>
        <HairlineTable
          caption={texts.monthCaption}
          columns={monthColumns}
          rows={[...months].reverse().filter((one) => one.orders > 0 || one.refunded.minor > 0)}
          rowKey={(one) => one.month}
        />
      </SameAsTable>
    </Box>
  );
}

const Figures = ({ figures }: { figures: SalesFigures }) => (
  <Box display="grid" gap="12">
    <Months months={figures.months} />
    {figures.countries.length > 0 && (
      <Box
        display="grid"
        columnGap="16"
        rowGap="12"
        alignItems="start"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'repeat(2, minmax(0, 1fr))' }}
      >
        <Box as="section">
          <Heading level={2} look="subsection" marginBottom="2">
            {texts.byCountry}
          </Heading>
          <BarList
            caption={texts.countryCaption}
            columns={countryColumns}
            rows={figures.countries}
            rowKey={(one) => one.country}
            worthOf={(one) => one.gross.minor}
          />
        </Box>
        <Box as="section">
          <Heading level={2} look="subsection" marginBottom="2">
            {texts.byKit}
          </Heading>
          <BarList
            caption={texts.kitCaption}
            columns={kitColumns}
            rows={figures.kits}
            rowKey={(one) => one.kitId}
            worthOf={(one) => one.gross.minor}
          />
        </Box>
      </Box>
    )}
  </Box>
);

/** How it sells: by month, by country, by kit. */
export function SalesPage() {
  const [params, setParams] = useSearchParams();
  const asked = Number(params.get('months'));
  const months = spans.includes(asked) ? asked : 12;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/sales',
    { query: { months } },
    { keepPreviousData: true },
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <LedgerHead title={texts.title} lead={texts.lead} />
      <Box maxWidth="14rem" marginBottom="8">
        <SelectField
          label={texts.span}
          value={String(months)}
          onChange={(event) => setParams(event.target.value === '12' ? {} : { months: event.target.value })}
          options={spans.map((span) => ({ value: String(span), label: texts.spans[span] ?? '' }))}
        />
      </Box>
      {data ? (
        <Figures figures={data} />
      ) : fault ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <SkeletonLines lines={6} />
      )}
      {data && data.countries.length === 0 && <Text isSoft>{texts.none}</Text>}
    </Band>
  );
}
