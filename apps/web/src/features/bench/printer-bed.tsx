import { Box } from '@chakra-ui/react/box';
import { buildVolume } from '../../lib/format.js';
import { usePrinters } from './use-printers.js';

/** The size of one's printer, after its name in the header. */
export function PrinterBed() {
  const { chosen } = usePrinters();
  if (!chosen) return null;
  return (
    // Between the two widths the header has no room for three numbers.
    <Box as="span" display={{ base: 'inline', md: 'none', lg: 'inline' }}>
      : {buildVolume(chosen.bed)}
    </Box>
  );
}
