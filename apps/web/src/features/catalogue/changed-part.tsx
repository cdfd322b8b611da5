import { Box } from '@chakra-ui/react/box';
import type { Part } from '@windchest/contracts';
import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { changesTexts as texts } from '../../config/texts/workshop-changes.js';
import { partsTexts } from '../../config/texts/workshop-parts.js';
import { number } from '../../lib/format.js';
import { PlaceSign } from '../../ui/drawing/place-mark.js';
import { ThreeViews } from '../../ui/drawing/three-views.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Heading, Text } from '../../ui/text.js';
import { ChangedSizes } from './changed-sizes.js';
import { MarkField } from './mark-field.js';
import { partIn } from './part-meshes.js';
import type { ComparisonRow, PartRow } from './part-rows.js';

const sizeText = (mm: number) => number(mm, 2);

/** Where the shapes lie farthest apart, with the sign that marks it on the drawing; or how far the comparing is. */
export const Where = ({ deviation }: { deviation: NonNullable<ComparisonRow['deviation']> }) => {
  if (deviation.state === 'waiting')
    return (
      <StatusMark state="wait" fontWeight="normal">
        {partsTexts.comparingOne}
      </StatusMark>
    );
  if (deviation.state === 'failed') return <StatusMark state="warn">{deviation.where}</StatusMark>;
  return (
    <Box display="flex" gap="2" lineHeight="snug">
      {deviation.placeMm && <PlaceSign />}
      <span>{deviation.where}</span>
    </Box>
  );
};

interface DrawingProps {
  row: PartRow;
  earlier: Part | undefined;
  earlierLabel: string | undefined;
}

function Drawing({ row: { part, code, name, comparison }, earlier, earlierLabel }: DrawingProps) {
  const deviation = comparison?.deviation;
  const now = partIn(part, deviation?.clearance)?.drawings;
  const before = partIn(earlier, deviation?.clearance)?.drawings;
  if (!now || !deviation) return <Text isSoft>{texts.notMeasured}</Text>;
  const { placeMm, largestMm, where, boxMm, earlierBoxMm, clearance } = deviation;
  const caption = [
    clearance && texts.drawnIn(clearanceTexts.signs[clearance]),
    before && earlierLabel && texts.dashed(earlierLabel),
  ].filter(Boolean);
  return (
    <>
      <ThreeViews
        shape={{ drawings: now, boxMm }}
        earlier={before ? { drawings: before, boxMm: earlierBoxMm } : undefined}
        place={placeMm && largestMm !== null ? { atMm: placeMm, label: number(largestMm, 2) } : undefined}
        label={placeMm ? texts.drawingMarked(code, name, where) : texts.drawing(code, name)}
        sizeText={sizeText}
      />
      {caption.length > 0 && (
        <Text look="small" isSoft marginTop="1.5">
          {caption.join(' ')}
        </Text>
      )}
    </>
  );
}

export interface ChangedPartProps extends DrawingProps {
  revisionId: string;
  isWritable: boolean;
}

/** One changed part: drawn from three sides, where it differs most, its sizes then and now, and its mark. */
export function ChangedPart({ row, earlier, earlierLabel, revisionId, isWritable }: ChangedPartProps) {
  const ref = useRef<HTMLDivElement>(null);
  const { hash } = useLocation();
  const id = `change-${row.code}`;
  useEffect(() => {
    // The browser looked for the place before it was there.
    if (hash === `#${id}`) ref.current?.scrollIntoView();
  }, [hash, id]);
  const { comparison, part } = row;
  if (!comparison) return null;
  const clearance = comparison.deviation?.clearance;
  return (
    <Box ref={ref} id={id} paddingBlock="5" borderTopWidth="1px" borderColor="hairline" scrollMarginTop="4">
      <Heading level={3} look="body" fontWeight="bold">
        {row.code}{' '}
        <Box as="span" fontWeight="normal" color="ink.soft">
          {row.name}
        </Box>
      </Heading>
      <Box
        display="grid"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', md: 'minmax(0, 1fr) minmax(0, 1fr)' }}
        columnGap="8"
        rowGap="4"
        marginTop="3"
      >
        <Box minWidth="0">
          <Drawing row={row} earlier={earlier} earlierLabel={earlierLabel} />
        </Box>
        <Box minWidth="0">
          {comparison.deviation && <Where deviation={comparison.deviation} />}
          {(!comparison.deviation || comparison.variants.length > 0) && <Text>{comparison.whatDiffers}</Text>}
          <ChangedSizes
            code={row.code}
            row={comparison}
            now={partIn(part, clearance)?.file?.measurement ?? null}
            before={partIn(earlier, clearance)?.file?.measurement ?? null}
            beforeLabel={earlierLabel}
          />
          <Box marginTop="4">
            <Box fontSize="sm" fontWeight="semibold" marginBottom="1">
              {texts.should}
            </Box>
            <MarkField revisionId={revisionId} row={comparison} isWritable={isWritable} />
          </Box>
        </Box>
      </Box>
    </Box>
  );
}
