import { Box } from '@chakra-ui/react/box';
import type { Bed, Plate } from '@windchest/plates';
import { type ReactNode, useState } from 'react';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { buildVolume, number } from '../../lib/format.js';
import { Button } from '../../ui/button.js';
import { Heading } from '../../ui/text.js';
import { type PiecesOfPart, piecesOn } from './plan-figures.js';
import { PlateDrawing } from './plate-drawing.js';
import { PlateLegend } from './plate-legend.js';
import { PlateThumbs } from './plate-thumbs.js';

export interface PlatePagesProps {
  plates: readonly Plate[];
  bed: Bed;
  marginMm: number;
  gapMm: number;
  nameOf: (code: string) => string;
  hoursOf: (pieces: readonly PiecesOfPart[]) => { low: number; high: number };
  massOf: (pieces: readonly PiecesOfPart[]) => number | null;
  /** Under the drawing: what changes it. */
  settings: ReactNode;
}

/** The plates one at a time, to scale, each with what lies on it. */
export function PlatePages({
  plates,
  bed,
  marginMm,
  gapMm,
  nameOf,
  hoursOf,
  massOf,
  settings,
}: PlatePagesProps) {
  const [wanted, setWanted] = useState(0);
  const shown = Math.min(wanted, plates.length - 1);
  const plate = plates[shown];
  if (!plate) return null;
  const pieces = piecesOn([plate]);
  const title = plates.length === 1 ? texts.thePlate : texts.plateOf(shown + 1, plates.length);
  const described = pieces.map(({ code, quantity }) => texts.timesPart(number(quantity), code)).join(', ');
  return (
    <Box>
      <Box display="flex" flexWrap="wrap" alignItems="center" columnGap="4" rowGap="2" marginBottom="3">
        <Heading level={3} look="body" aria-live="polite" minWidth="7.5rem">
          {title}
        </Heading>
        {plates.length > 1 && (
          <Box display="flex" gap="2">
            <Button
              look="outline"
              size="sm"
              aria-label={texts.previous}
              aria-disabled={shown === 0 || undefined}
              onClick={() => setWanted(Math.max(0, shown - 1))}
            >
              ←
            </Button>
            <Button
              look="outline"
              size="sm"
              aria-label={texts.next}
              aria-disabled={shown === plates.length - 1 || undefined}
              onClick={() => setWanted(Math.min(plates.length - 1, shown + 1))}
            >
              →
            </Button>
          </Box>
        )}
      </Box>
      <Box
        display="grid"
        gridTemplateColumns={{
          base: 'minmax(0, 1fr)',
          md: 'minmax(0, 25rem) minmax(0, 1fr)',
          xl: 'minmax(0, 36rem) minmax(0, 1fr)',
        }}
        columnGap="8"
        rowGap="5"
      >
        <Box minWidth="0">
          <PlateDrawing
            plate={plate}
            bed={bed}
            marginMm={marginMm}
            gapMm={gapMm}
            description={texts.drawn(title, described, buildVolume(bed))}
          />
          {plates.length > 1 && (
            <Box marginTop="3">
              <PlateThumbs plates={plates} bed={bed} shown={shown} onShow={setWanted} />
            </Box>
          )}
          <Box marginTop="5">{settings}</Box>
        </Box>
        <PlateLegend pieces={pieces} nameOf={nameOf} hours={hoursOf(pieces)} massG={massOf(pieces)} />
      </Box>
    </Box>
  );
}
