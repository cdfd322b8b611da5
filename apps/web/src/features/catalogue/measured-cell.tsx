import { Box } from '@chakra-ui/react/box';
import type { Measurement, RevisionFile } from '@windchest/contracts';
import { partsTexts } from '../../config/texts/workshop-parts.js';
import { number } from '../../lib/format.js';
import { StatusMark } from '../../ui/status-mark.js';

/** `18.2 × 18.2 × 158.5 mm` */
export const sizeWords = ({ sizeMm }: Pick<Measurement, 'sizeMm'>): string =>
  `${[sizeMm.x, sizeMm.y, sizeMm.z].map((side) => number(side, side < 10 ? 2 : 1)).join(' × ')} mm`;

/** What keeps a mesh from being watertight, with counts. */
export const meshFaults = (mesh: Measurement): string =>
  [
    mesh.openEdges > 0 && partsTexts.openEdges(mesh.openEdges),
    mesh.nonManifoldEdges > 0 && partsTexts.nonManifold(mesh.nonManifoldEdges),
    mesh.windingFaults > 0 && partsTexts.flipped(mesh.windingFaults),
  ]
    .filter(Boolean)
    .join(', ') || partsTexts.notClosed;

/** What a part's file measures, or how far the measuring is, or why it was refused. */
export function MeasuredCell({ file }: { file: RevisionFile | null }) {
  if (!file) return <StatusMark state="stop">{partsTexts.noFile}</StatusMark>;
  if (file.measuring === 'refused')
    return (
      <Box>
        <StatusMark state="stop">{partsTexts.refused}</StatusMark>
        <Box fontSize="sm" lineHeight="snug">
          {file.fault}
        </Box>
      </Box>
    );
  const mesh = file.measurement;
  if (!mesh)
    return (
      <StatusMark state="wait" fontWeight="normal">
        {file.measuring === 'measuring' ? partsTexts.measuring : partsTexts.waiting}
      </StatusMark>
    );
  return (
    <Box lineHeight="1.4">
      <Box whiteSpace={{ md: 'nowrap' }} fontSize={{ md: 'sm' }}>
        {sizeWords(mesh)}
      </Box>
      <Box fontSize={{ md: 'sm' }}>{number(mesh.volumeCm3, mesh.volumeCm3 < 10 ? 2 : 1)} cm³</Box>
      <StatusMark state={mesh.isWatertight ? 'ok' : 'stop'} fontWeight="normal">
        {mesh.isWatertight ? partsTexts.watertight : meshFaults(mesh)}
      </StatusMark>
      {mesh.unitRemark && (
        <StatusMark state="warn" fontWeight="normal">
          {mesh.unitRemark}
        </StatusMark>
      )}
    </Box>
  );
}
