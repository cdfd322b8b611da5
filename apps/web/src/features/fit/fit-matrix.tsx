import { Box } from '@chakra-ui/react/box';
import type { FitCell, FitMatrix as Matrix } from '@windchest/contracts';
import { certaintyTexts, fitListTexts as texts } from '../../config/texts/workshop-fit.js';
import { signed } from '../../lib/format.js';
import { StatusMark } from '../../ui/status-mark.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';

const mm = (value: number) => signed(value, 2);
const signs = { sure: 'warn', likely: 'wait', unsure: 'none' } as const;

/** One or two good prints prove nothing yet. */
const isGood = (cell: FitCell) => cell.changePerSideMm === 0 && cell.count >= 3;

const Cell = ({ cell }: { cell: FitCell }) => (
  <Box lineHeight="1.4">
    <Box fontWeight="semibold" whiteSpace="nowrap">
      {texts.median(mm(cell.medianMm))}
    </Box>
    <Box fontSize="sm" color="ink.soft">
      {texts.spread(mm(cell.quartilesMm[0]), mm(cell.quartilesMm[1]))}
    </Box>
    <Box fontSize="sm" color="ink.soft">
      {texts.count(cell.count, cell.measured)}
    </Box>
    {cell.intervalMm && (
      <Box fontSize="sm" color="ink.soft">
        {texts.interval(mm(cell.intervalMm[0]), mm(cell.intervalMm[1]))}
      </Box>
    )}
    <Box fontSize="sm" marginTop="1">
      <StatusMark state={isGood(cell) ? 'ok' : signs[cell.certainty]} fontWeight="normal">
        {isGood(cell)
          ? texts.noChange
          : `${texts.change(mm(cell.changePerSideMm))}, ${certaintyTexts[cell.certainty]}`}
      </StatusMark>
    </Box>
  </Box>
);

/** Part by material: how they come out, and what would make them fit. */
export function FitMatrix({ matrix }: { matrix: Matrix }) {
  type Row = Matrix['rows'][number];
  const columns: Column<Row>[] = [
    {
      key: 'part',
      header: '',
      isHeading: true,
      cell: ({ partCode, partName }) => (
        <Box>
          <b>{partCode}</b> {partName}
        </Box>
      ),
    },
    { key: 'all', header: texts.all, cell: ({ all }) => <Cell cell={all} /> },
    ...matrix.materials.map((material): Column<Row> => ({
      key: `material-${material}`,
      header: material,
      cell: ({ cells }) => (cells[material] ? <Cell cell={cells[material]} /> : null),
    })),
  ];
  return (
    <Box overflowX="auto">
      <HairlineTable
        caption={texts.matrixCaption}
        columns={columns}
        rows={matrix.rows}
        rowKey={({ partCode }) => partCode}
      />
    </Box>
  );
}
