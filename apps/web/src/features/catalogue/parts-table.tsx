import { Box } from '@chakra-ui/react/box';
import type { RevisionDetail } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { partsTexts } from '../../config/texts/workshop-parts.js';
import { Button } from '../../ui/button.js';
import { PartThumb } from '../../ui/drawing/parts-sheet.js';
import { TextLink } from '../../ui/link.js';
import { StatusMark } from '../../ui/status-mark.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import type { SignName } from '../../ui/sign.js';
import type { PreviewedPart } from '../bench/part-preview/part-turner.js';
import { previewOfPart } from '../bench/part-preview/previewed-part.js';
import { TurnButton } from '../bench/part-preview/turn-button.js';
import { useTurning } from '../bench/part-preview/use-turning.js';
import { MarkField } from './mark-field.js';
import { MeasuredMeshes } from './measured-meshes.js';
import type { Difference, PartRow } from './part-rows.js';
import { useComparedWith } from './use-compared-with.js';

const signs: Record<Difference, SignName> = {
  changed: 'warn',
  new: 'ok',
  dropped: 'stop',
  're-exported': 'none',
  same: 'none',
};

/** Of front and top view the one that shows more: a flat plate seen from the front is a line. */
const drawingOf = ({ part }: PartRow) => {
  if (!part?.drawings) return null;
  const { front, top } = part.drawings;
  return front.widthMm * front.heightMm >= top.widthMm * top.heightMm ? front : top;
};

interface PartCellProps extends Pick<PartsTableProps, 'onEdit'> {
  revisionId: string;
  row: PartRow;
  onTurn: (part: PreviewedPart) => void;
}

const PartCell = ({ row, revisionId, onEdit, onTurn }: PartCellProps) => {
  const drawing = drawingOf(row);
  const { part } = row;
  const preview = part && previewOfPart(revisionId, part, drawing);
  return (
    <Box id={`part-${row.code}`} display="flex" gap="3.5" alignItems="center" scrollMarginTop="4">
      <Box width="2.75rem" flex="none" display="grid" placeItems="center">
        {drawing && <PartThumb part={drawing} />}
      </Box>
      <Box minWidth="0" lineHeight="1.4">
        <Box fontWeight="bold">{row.code}</Box>
        <Box color="ink.soft" fontWeight="normal">
          {row.name}
        </Box>
        {part?.isGauge && (
          <Box fontSize="sm" fontWeight="normal">
            {partsTexts.gauge}
          </Box>
        )}
        <Box display="flex" flexWrap="wrap" columnGap="4">
          {onEdit && part && (
            <Button
              look="plain"
              size="sm"
              minHeight="1.5rem"
              paddingBlock="0"
              onClick={() => onEdit(part.id)}
              aria-label={partsTexts.editOf(row.code)}
            >
              {partsTexts.edit}
            </Button>
          )}
          {preview && <TurnButton code={row.code} onTurn={() => onTurn(preview)} />}
        </Box>
      </Box>
    </Box>
  );
};

const SinceCell = ({
  row: { comparison, code },
  toDrawing,
}: {
  row: PartRow;
  toDrawing: (code: string) => string;
}) =>
  comparison && (
    <Box>
      <StatusMark
        state={signs[comparison.difference]}
        fontWeight={
          comparison.difference === 'same' || comparison.difference === 're-exported' ? 'normal' : 'semibold'
        }
      >
        {partsTexts.differences[comparison.difference]}
      </StatusMark>
      {comparison.whatDiffers && comparison.difference !== 'dropped' && comparison.difference !== 'new' && (
        <Box lineHeight="snug">{comparison.whatDiffers}</Box>
      )}
      {comparison.difference === 'changed' && comparison.deviation && (
        <Box marginTop="1" lineHeight="snug">
          {comparison.deviation.state === 'waiting' ? (
            <StatusMark state="wait" fontWeight="normal">
              {partsTexts.comparingOne}
            </StatusMark>
          ) : (
            <>
              {comparison.deviation.where}
              <Box>
                <TextLink to={toDrawing(code)} aria-label={partsTexts.drawnOf(code)}>
                  {partsTexts.drawn}
                </TextLink>
              </Box>
            </>
          )}
        </Box>
      )}
    </Box>
  );

export interface PartsTableProps {
  rows: readonly PartRow[];
  comparedWith: string | undefined;
  revision: RevisionDetail;
  /** Left out where nothing may be changed. */
  onEdit: ((partId: string) => void) | undefined;
  isMarkable: boolean;
}

/** Every part with its drawing, what it measures, what changed, and what buyers should do about it. */
export function PartsTable({ rows, comparedWith, revision, onEdit, isMarkable }: PartsTableProps) {
  const [turning, turn] = useTurning();
  const { withId } = useComparedWith();
  const changes = paths.workshop.changes.to(
    { kitId: revision.kit.id, revisionId: revision.id },
    { with: withId },
  );
  const columns: Column<PartRow>[] = [
    {
      key: 'part',
      header: partsTexts.columns.part,
      width: '21%',
      isHeading: true,
      cell: (row) => <PartCell row={row} revisionId={revision.id} onEdit={onEdit} onTurn={turn} />,
    },
    {
      key: 'quantity',
      header: partsTexts.columns.quantity,
      isNumeric: true,
      cell: (row) => (
        <Box as="span" whiteSpace="nowrap">
          {partsTexts.pieces(row.quantity)}
        </Box>
      ),
    },
    {
      key: 'measured',
      header: partsTexts.columns.measured,
      width: '20%',
      cell: (row) => row.part && <MeasuredMeshes part={row.part} />,
    },
    {
      key: 'since',
      header: partsTexts.columns.since(comparedWith),
      width: '29%',
      cell: (row) => <SinceCell row={row} toDrawing={(code) => `${changes}#change-${code}`} />,
    },
    {
      key: 'should',
      header: partsTexts.columns.should,
      width: '24%',
      cell: (row) =>
        row.comparison && (
          <MarkField key={row.code} revisionId={revision.id} row={row.comparison} isWritable={isMarkable} />
        ),
    },
  ];
  return (
    <>
      <HairlineTable caption={partsTexts.caption} columns={columns} rows={rows} rowKey={(row) => row.code} />
      {turning}
    </>
  );
}
