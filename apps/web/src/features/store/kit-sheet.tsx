import { Box } from '@chakra-ui/react/box';
import type { KitPage } from '@windchest/contracts';
import { useMemo, useState } from 'react';
import { kitTexts } from '../../config/texts/kit.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { bytes, counted } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { scaleText } from '../../ui/drawing/rank-layout.js';
import { SplitSheet } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';
import { drawnVoices, hasTrueSizes } from '../bench/drawn-voices.js';
import { RankBoard } from '../bench/rank-board.js';
import { useRankScale } from '../bench/rank-scale.js';
import type { RankInRoom } from '../bench/use-predicted-rank.js';
import { BasketCell } from './basket-cell.js';
import { KitTitleBlock } from './kit-title-block.js';
import { LicenceChoice } from './licence-choice.js';
import { liveOffers, offerForLicence } from './offers.js';
import { OwnedNotice } from './owned-notice.js';

const rankHeightPx = 316;

/** The kit's drawing, what can be bought, and the title block with the price. */
export function KitSheet({ kit, inRoom }: { kit: KitPage; inRoom: RankInRoom }) {
  const { isSignedIn } = useSession();
  const offers = useEndpoint('GET /offers', {}, liveOffers);
  const owned = useEndpoint('GET /shelf/owned', isSignedIn ? {} : null);
  const [licenceId, setLicenceId] = useState(kit.licences[0]?.id);
  const licence = kit.licences.find((one) => one.id === licenceId) ?? kit.licences[0];
  const offer = licence && offerForLicence(licence.id, offers.data ?? []);
  const isOwned = owned.data?.includes(kit.slug) ?? false;

  const voices = useMemo(() => drawnVoices(kit.rank), [kit.rank]);
  const [measured, layout] = useRankScale(voices, rankHeightPx);

  return (
    <SplitSheet
      asideLabel={kitTexts.buy}
      main={
        <>
          <Heading level={1} look="display">
            {kit.name}
          </Heading>
          <Text look="lead" marginTop="2" marginBottom={{ base: '6', md: '9' }} maxWidth="34em">
            {kit.tagline}
          </Text>
          {kit.rank.length > 0 && (
            <RankBoard
              rank={kit.rank}
              voices={voices}
              layout={layout}
              measured={measured}
              maxHeightPx={rankHeightPx}
              inRoom={inRoom}
            />
          )}
        </>
      }
      aside={
        <Box display="flex" flexDirection="column" justifyContent="flex-end" height="full" gap="5">
          <Text isSoft>
            {kitTexts.bundle(
              counted(kit.partCount, kitTexts.onePart, kitTexts.manyParts),
              bytes(kit.bundleBytes).replace(' ', '\u00a0'),
            )}{' '}
            {kitTexts.later}
          </Text>
          {licence && <LicenceChoice licences={kit.licences} chosen={licence} onChoose={setLicenceId} />}
          {isOwned && licence && <OwnedNotice kitSlug={kit.slug} licenceId={licence.id} />}
        </Box>
      }
      block={
        <KitTitleBlock
          kit={kit}
          scale={layout.pxPerMm > 0 && hasTrueSizes(kit.rank) ? scaleText(layout.pxPerMm) : ''}
          licence={licence}
          offer={offer}
          action={licence && <BasketCell kit={kit} licence={licence} offer={offer} isOwned={isOwned} />}
        />
      }
    />
  );
}
