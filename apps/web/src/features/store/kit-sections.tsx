import { Box } from '@chakra-ui/react/box';
import type { KitPage, KitPart } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { kitTexts } from '../../config/texts/kit.js';
import type { Answered } from '../../lib/use-endpoint.js';
import { number } from '../../lib/format.js';
import { roomTexts } from '../../config/texts/room.js';
import { Details } from '../../ui/details.js';
import { Text } from '../../ui/text.js';
import type { RankInRoom } from '../bench/use-predicted-rank.js';
import { voiceNoun } from '../bench/voice-noun.js';
import { VoicesTable } from '../bench/voices-table.js';
import { TextLink } from '../../ui/link.js';
import { Markdown } from '../../ui/markdown.js';
import { Band } from '../../ui/sheet.js';
import { FitSection } from './fit-section.js';
import { HardwareList } from './hardware-list.js';
import { PartsSection } from './parts-section.js';
import { PrintSpec } from './print-spec.js';
import { RevisionList } from './revision-list.js';
import { RuledSection } from './ruled-section.js';

export interface KitSectionsProps {
  kit: KitPage;
  parts: Answered<KitPart[]>;
  inRoom: RankInRoom;
}

/** What stands under the kit's sheet. */
export const KitSections = ({ kit, parts, inRoom }: KitSectionsProps) => (
  <Band paddingTop={{ base: '2', md: '4' }}>
    <RuledSection title={kitTexts.fit} isWide>
      <FitSection kit={kit} />
    </RuledSection>
    {kit.description.trim() && (
      <RuledSection title={kitTexts.about}>
        <Markdown text={kit.description} />
      </RuledSection>
    )}
    {kit.rank.length > 0 && (
      <RuledSection title={kitTexts.voices}>
        <Text isSoft marginBottom="2">
          {kitTexts.voicesLead(
            roomTexts.degrees(kit.room.temperatureC),
            number(kit.declaredCents),
            voiceNoun(kit.rank).one,
          )}
        </Text>
        <Details summary={roomTexts.table}>
          <VoicesTable rank={kit.rank} predicted={inRoom.predicted} temperatureC={inRoom.room.temperatureC} />
        </Details>
      </RuledSection>
    )}
    <RuledSection title={kitTexts.partsHeading} isWide>
      <PartsSection kit={kit} parts={parts} />
    </RuledSection>
    <RuledSection title={kitTexts.spec}>
      <PrintSpec kit={kit} />
    </RuledSection>
    <RuledSection title={kitTexts.hardware}>
      <HardwareList hardware={kit.hardware} />
    </RuledSection>
    <RuledSection title={kitTexts.cautions}>
      {kit.cautions.trim() && <Markdown text={kit.cautions} />}
      <Box marginTop={kit.cautions.trim() ? '4' : undefined}>
        <TextLink to={paths.cautions.to()}>{kitTexts.allCautions}</TextLink>
      </Box>
    </RuledSection>
    <RuledSection title={kitTexts.revisions}>
      <RevisionList revisions={kit.revisions} />
    </RuledSection>
  </Band>
);
