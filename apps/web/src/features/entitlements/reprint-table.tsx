import { Box } from '@chakra-ui/react/box';
import type { ReprintPart } from '@windchest/contracts';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { reprintTexts as texts } from '../../config/texts/reprint.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Unbroken } from '../../ui/unbroken.js';
import { type ReprintRow, reprintRows } from './reprint-list.js';

const sentence = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** Each step's reason; with its revision where there are several. */
function whyOf({ advice, steps, spare }: ReprintRow): string[] {
  const told = steps.filter(({ reason }) => reason !== '');
  const reasons = told.map(({ revision, reason }) =>
    told.length > 1 ? texts.step(revision, reason) : reason,
  );
  if (advice === 'if-it-troubles') return [texts.ifItTroubles, ...reasons];
  if (advice === 'not-asked') return [texts.unmarked];
  if (advice === 'fewer' || advice === 'dropped') return [texts.spare(spare)];
  return reasons;
}

const columns: readonly Column<ReprintRow>[] = [
  {
    key: 'part',
    header: texts.part,
    isHeading: true,
    cell: (row) => (
      <span>
        <Box as="b" fontWeight="bold">
          {row.codes.join(', ')}
        </Box>{' '}
        {row.name}
        {row.clearance && (
          <Box as="span" fontWeight="normal">
            , {texts.inClearance(clearanceTexts.signs[row.clearance])}
          </Box>
        )}
      </span>
    ),
  },
  {
    key: 'print',
    header: texts.print,
    isNumeric: true,
    cell: (row) => <Unbroken>{row.pieces > 0 ? texts.times(row.pieces) : texts.noPrint}</Unbroken>,
  },
  { key: 'differs', header: texts.whatDiffers, cell: (row) => sentence(row.whatDiffers) },
  {
    key: 'why',
    header: texts.why,
    cell: (row) => (
      <>
        {whyOf(row).map((line) => (
          <Box as="span" display="block" key={line}>
            {line}
          </Box>
        ))}
      </>
    ),
  },
];

const withTick: readonly Column<ReprintRow>[] = [
  ...columns,
  {
    key: 'tick',
    header: texts.tick,
    cell: ({ pieces }) => (
      <Box as="span" display="flex" gap="1.5" aria-hidden>
        {Array.from({ length: Math.min(pieces, 8) }, (_, at) => (
          <Box key={at} as="span" boxSize="4" borderWidth="1px" borderColor="edge" />
        ))}
      </Box>
    ),
  },
];

/** Nothing where no part differs. `hasTicks` leaves room to tick pieces off on paper. */
export function ReprintTable({ parts, hasTicks }: { parts: readonly ReprintPart[]; hasTicks?: boolean }) {
  const rows = reprintRows(parts);
  if (rows.length === 0) return null;
  return (
    <HairlineTable
      caption={texts.caption}
      columns={hasTicks ? withTick : columns}
      rows={rows}
      rowKey={(row) => row.codes.join()}
    />
  );
}
