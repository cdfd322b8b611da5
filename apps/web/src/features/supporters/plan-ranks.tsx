import { Box } from '@chakra-ui/react/box';
import type { Plan } from '@windchest/contracts';
import { supportTexts as texts } from '../../config/texts/pledge.js';
import { Rank } from '../../ui/drawing/rank.js';
import type { ExtentMm } from '../../ui/drawing/rank-layout.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { drawnVoices } from '../bench/drawn-voices.js';

export interface PlanRanksProps {
  kits: Plan['kits'];
  /** Of the largest rank on the page, so that all are drawn to one scale. */
  extent: ExtentMm;
}

/** The kits of a plan, each by its rank, in its own colour. */
export const PlanRanks = ({ kits, extent }: PlanRanksProps) => (
  <Box
    as="ul"
    listStyle="none"
    display="grid"
    gridTemplateColumns="repeat(auto-fill, minmax(min(8.5rem, 100%), 1fr))"
    columnGap="6"
    rowGap="5"
    alignItems="end"
  >
    {kits.map((kit) => {
      const voices = drawnVoices(kit.rank);
      return (
        <KitColour as="li" key={kit.slug} palette={kit.colour} minWidth="0">
          <Rank
            voices={voices}
            extent={extent}
            maxHeightPx={76}
            description={texts.drawn(kit.name, voices.length)}
          />
          <Box fontSize="sm" marginTop="1" overflowWrap="anywhere">
            {kit.name}
          </Box>
        </KitColour>
      );
    })}
  </Box>
);
