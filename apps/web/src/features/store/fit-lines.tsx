import { Box } from '@chakra-ui/react/box';
import type { KitPage, KitPart } from '@windchest/contracts';
import { useMemo } from 'react';
import { kitTexts } from '../../config/texts/kit.js';
import { buildVolume, millimetres } from '../../lib/format.js';
import type { PrinterCard } from '../../lib/printer-card.js';
import { StatusLine } from '../../ui/status-mark.js';
import { Text } from '../../ui/text.js';
import { useLoaded } from '../bench/use-loaded.js';
import { fitWords } from './fit-words.js';

const load = () => import('../bench/fit-report.js');

export interface FitLinesProps {
  kit: KitPage;
  parts: readonly KitPart[] | undefined;
  printer: PrinterCard;
}

export function FitLines({ kit, parts, printer }: FitLinesProps) {
  const loaded = useLoaded(load);
  const report = useMemo(
    () => (loaded && parts ? loaded.fitReport(parts, printer.bed) : undefined),
    [loaded, parts, printer.bed],
  );
  if (!report) return <Text isSoft>{kitTexts.fitWorking}</Text>;
  const lines = fitWords(report, `${buildVolume(printer.bed)}`);
  const isOtherNozzle = printer.nozzleMm !== kit.printSpec.nozzleMm;
  return (
    <Box as="ul" listStyle="none" width="full" marginTop={{ lg: '-2' }}>
      {lines.map((line) => (
        <StatusLine key={line.words} state={line.state}>
          {line.words}
        </StatusLine>
      ))}
      {isOtherNozzle && (
        <StatusLine state="note">
          {kitTexts.fitNozzle(millimetres(kit.printSpec.nozzleMm, 2), millimetres(printer.nozzleMm, 2))}
        </StatusLine>
      )}
    </Box>
  );
}
