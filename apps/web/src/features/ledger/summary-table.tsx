import { Box } from '@chakra-ui/react/box';
import type { SummaryRow } from '@windchest/contracts';
import { quarterTexts as texts, ratesTexts } from '../../config/texts/workshop-tax.js';
import { number, price } from '../../lib/format.js';
import { countryName } from '../../lib/workshop-format.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading } from '../../ui/text.js';
import { Unbroken } from '../../ui/unbroken.js';

type Treatment = SummaryRow['treatment'];

const amountColumn = (key: 'net' | 'tax' | 'gross'): Column<SummaryRow> => ({
  key,
  header: texts.columns[key],
  isNumeric: true,
  width: '14%',
  cell: (row) => <Unbroken>{price(row[key])}</Unbroken>,
});
const columnsWith = (missing: readonly string[]): Column<SummaryRow>[] => [
  {
    key: 'country',
    header: texts.columns.country,
    isHeading: true,
    cell: (row) => countryName(row.country),
  },
  {
    key: 'rate',
    header: texts.columns.rate,
    isNumeric: true,
    width: '11%',
    cell: (row) =>
      row.treatment === 'consumer' && missing.includes(row.country)
        ? texts.noTaxYet
        : ratesTexts.percent(row.ratePercent),
  },
  {
    key: 'receipts',
    header: texts.columns.receipts,
    isNumeric: true,
    width: '11%',
    cell: (row) => number(row.receipts),
  },
  {
    key: 'creditNotes',
    header: texts.columns.creditNotes,
    isNumeric: true,
    width: '12%',
    cell: (row) => number(row.creditNotes),
  },
  amountColumn('net'),
  amountColumn('tax'),
  amountColumn('gross'),
];

export interface SummaryTableProps {
  treatment: Treatment;
  rows: readonly SummaryRow[];
  missingRates: readonly string[];
}

/** The rows of one way of being taxed; reverse charge stands by itself, as it is declared by itself. */
export const SummaryTable = ({ treatment, rows, missingRates }: SummaryTableProps) => (
  <Box as="section" marginBottom="9">
    <Heading level={2} look="subsection" marginBottom="2">
      {texts.sections[treatment]}
    </Heading>
    <HairlineTable
      caption={texts.captionOf(texts.sections[treatment])}
      columns={columnsWith(missingRates)}
      // By name, as they are read; the API knows codes alone.
      rows={rows.toSorted((a, b) => countryName(a.country).localeCompare(countryName(b.country)))}
      rowKey={(row) => `${row.country} ${row.ratePercent} ${row.currency}`}
    />
  </Box>
);
