import { Box } from '@chakra-ui/react/box';
import type { ShelfKit } from '@windchest/contracts';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Unbroken } from '../../ui/unbroken.js';
import { type ReprintRow, reprintRows } from './reprint-list.js';

const sentence = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function why({ advice, reason }: ReprintRow): string {
  if (advice === 'if-it-troubles')
    return reason ? `${shelfKitTexts.ifItTroubles}: ${reason}` : shelfKitTexts.ifItTroubles;
  return reason || (advice === 'not-asked' ? shelfKitTexts.unmarked : '');
}

const columns: readonly Column<ReprintRow>[] = [
  {
    key: 'part',
    header: shelfKitTexts.part,
    isHeading: true,
    cell: (row) => (
      <span>
        <Box as="b" fontWeight="bold">
          {row.codes.join(', ')}
        </Box>{' '}
        {row.name}
        {row.clearance && (
          <Box as="span" fontWeight="normal">
            , {shelfKitTexts.inClearance(clearanceTexts.signs[row.clearance])}
          </Box>
        )}
      </span>
    ),
  },
  {
    key: 'print',
    header: shelfKitTexts.print,
    isNumeric: true,
    cell: (row) => (
      <Unbroken>
        {row.advice === 'print' || row.advice === 'if-it-troubles'
          ? shelfKitTexts.times(row.pieces)
          : shelfKitTexts.noPrint}
      </Unbroken>
    ),
  },
  { key: 'differs', header: shelfKitTexts.whatDiffers, cell: (row) => sentence(row.whatDiffers) },
  { key: 'why', header: shelfKitTexts.why, cell: why },
];

/** Nothing where no part differs. */
export function ReprintTable({ parts }: { parts: ShelfKit['parts'] }) {
  const rows = reprintRows(parts);
  if (rows.length === 0) return null;
  return (
    <Box marginTop="8">
      <HairlineTable
        caption={shelfKitTexts.differences}
        columns={columns}
        rows={rows}
        rowKey={(row) => row.codes.join()}
      />
    </Box>
  );
}
