import { Box } from '@chakra-ui/react/box';
import { useEffect, useRef } from 'react';
import { useNavigate } from 'react-router-dom';
import { noKitsTexts } from '../../config/texts/no-kits.js';
import { TextLink } from '../../ui/link.js';
import { OwnPrinterDialog } from '../bench/own-printer-dialog.js';
import { usePrinters } from '../bench/use-printers.js';
import { fitsWords } from './fits-words.js';
import { type Fits, kitListAddress, type KitSort } from './kit-list-query.js';

export interface FitFilterProps {
  fits: Fits;
  sort: KitSort;
}

/** Which bed the list is for; where that is one's own printer, finds out which, and asks where there is none. */
export function FitFilter({ fits, sort }: FitFilterProps) {
  const { chosen, isLoading } = usePrinters();
  const navigate = useNavigate();
  const isKept = useRef(false);
  const isOpen = fits === 'mine';
  const bed = chosen && `${chosen.bed.xMm}x${chosen.bed.yMm}x${chosen.bed.zMm}`;
  useEffect(() => {
    if (isOpen && bed) void navigate(kitListAddress({ sort, page: 1, fits: bed }), { replace: true });
  }, [isOpen, bed, sort, navigate]);

  const all = kitListAddress({ sort, page: 1, fits: undefined });
  if (isOpen) {
    if (bed || isLoading) return null;
    return (
      <OwnPrinterDialog
        onKept={() => (isKept.current = true)}
        // With a card kept the list follows by itself.
        onClose={() => !isKept.current && void navigate(all, { replace: true })}
      />
    );
  }
  return (
    <Box display="flex" flexWrap="wrap" columnGap="3">
      <span>{noKitsTexts.fitsOn(fitsWords(fits))}</span>
      <TextLink to={all}>{noKitsTexts.fitsAll}</TextLink>
    </Box>
  );
}
