import { Box } from '@chakra-ui/react/box';
import { loadingText } from '../config/texts/shared.js';
import { VisuallyHidden } from './visually-hidden.js';

const widths = ['92%', '78%', '86%', '64%', '81%'];

/** Faint rules where text will stand. They do not move. */
export const SkeletonLines = ({ lines = 3 }: { lines?: number }) => (
  <Box role="status" maxWidth="measure">
    <VisuallyHidden>{loadingText}</VisuallyHidden>
    {Array.from({ length: lines }, (_, at) => (
      <Box
        key={at}
        height="0.7rem"
        marginBlock="0.9rem"
        bg="hairline/70"
        style={{ width: widths[at % widths.length] }}
      />
    ))}
  </Box>
);
