import { Box } from '@chakra-ui/react/box';
import type { Part } from '@windchest/contracts';
import { Fragment } from 'react';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { VisuallyHidden } from '../../ui/visually-hidden.js';
import { MeasuredCell } from './measured-cell.js';
import { meshesOf } from './part-meshes.js';

/** What a part measures, in each of its clearances. */
export function MeasuredMeshes({ part }: { part: Part }) {
  if (part.variants.length === 0) return <MeasuredCell file={part.file} />;
  return (
    <Box
      display="grid"
      gridTemplateColumns="auto minmax(0, 1fr)"
      columnGap="2.5"
      rowGap="2"
      textAlign="start"
    >
      {meshesOf(part).map(({ clearance, file }) => (
        <Fragment key={clearance}>
          <Box fontWeight="bold" lineHeight="1.4" aria-hidden>
            {clearanceTexts.signs[clearance]}
          </Box>
          <Box minWidth="0">
            <VisuallyHidden>{clearanceTexts.named(clearance)}: </VisuallyHidden>
            <MeasuredCell file={file} />
          </Box>
        </Fragment>
      ))}
    </Box>
  );
}
