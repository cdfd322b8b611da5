import { Box } from '@chakra-ui/react/box';
import type { PrintSheetPart } from '@windchest/contracts';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { grams, hoursRange, number } from '../../lib/format.js';
import { StatusMark } from '../../ui/status-mark.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Unbroken } from '../../ui/unbroken.js';
import { liesWords } from './fit-words.js';
import type { PartOnPrinter } from './plates-work.js';

export interface FitRow {
  part: PrintSheetPart;
  on: PartOnPrinter;
  /** Of one print, in the filament chosen. */
  massG: number | null;
}

const columns: readonly Column<FitRow>[] = [
  {
    key: 'part',
    header: texts.part,
    isHeading: true,
    cell: ({ part }) => (
      <span>
        <Box as="span" fontWeight="semibold">
          {part.code}
        </Box>{' '}
        {part.name}
      </span>
    ),
  },
  { key: 'pieces', header: texts.pieces, isNumeric: true, cell: ({ part }) => number(part.quantity) },
  {
    key: 'lies',
    header: texts.lies,
    cell: ({ on }) => {
      const { state, words } = liesWords(on);
      return <StatusMark state={state}>{words}</StatusMark>;
    },
  },
  { key: 'rule', header: texts.rule, cell: ({ part }) => texts.rules[part.orientation] },
  {
    key: 'weight',
    header: texts.eachWeight,
    isNumeric: true,
    cell: ({ massG }) => <Unbroken>{massG === null ? texts.unknown : grams(massG)}</Unbroken>,
  },
  {
    key: 'time',
    header: texts.eachTime,
    isNumeric: true,
    cell: ({ on: { estimate } }) => (
      <Unbroken>
        {estimate ? hoursRange(estimate.minutes.low / 60, estimate.minutes.high / 60) : texts.unknown}
      </Unbroken>
    ),
  },
];

/** Every part against a printer. */
export const FitsTable = ({ rows }: { rows: readonly FitRow[] }) => (
  <HairlineTable
    caption={texts.everyPart(rows.length)}
    columns={columns}
    rows={rows}
    rowKey={({ part }) => part.code}
  />
);
