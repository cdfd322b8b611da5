import { Box } from '@chakra-ui/react/box';
import { SkeletonLines } from '../../ui/skeleton-lines.js';

/** Rows' places while the list is on its way. */
export const KitRowsSkeleton = () => (
  <Box paddingTop="8" minHeight="24rem">
    <SkeletonLines lines={5} />
  </Box>
);
