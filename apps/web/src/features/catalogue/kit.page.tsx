import { Box } from '@chakra-ui/react/box';
import type { WorkshopKit } from '@windchest/contracts';
import { lazy, Suspense } from 'react';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { kitTexts as texts } from '../../config/texts/workshop-kits.js';
import { number, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { Rank } from '../../ui/drawing/rank.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { TitleBlock } from '../../ui/title-block.js';
import { voicesOfParts } from './drawn-parts.js';
import { KitLicences } from './kit-licences.js';
import { KitRevisions } from './kit-revisions.js';
import { ListingSwitch } from './listing-switch.js';
import { useHolderCount } from './release-block.js';

const KitWordsForm = lazy(async () => ({ default: (await import('./kit-words-form.js')).KitWordsForm }));

const cheapest = ({ licences }: WorkshopKit) =>
  licences
    .filter((one) => one.isOffered)
    .map((one) => one.price)
    .sort((a, b) => a.minor - b.minor)[0];

/** The voices of the revision at hand: the draft, else the newest one. */
function useVoices(kit: WorkshopKit | undefined) {
  const revisionId = kit?.revisions[0]?.id;
  const { data } = useEndpoint(
    'GET /workshop/revisions/:revisionId',
    revisionId ? { params: { revisionId } } : null,
  );
  return voicesOfParts(data?.parts ?? []);
}

function KitBlock({ kit }: { kit: WorkshopKit }) {
  const { may } = useSession();
  const holders = useHolderCount(kit.id);
  const lowest = cheapest(kit);
  const newest = kit.revisions.find((one) => one.state === 'released');
  return (
    <TitleBlock
      fields={[
        { name: texts.newest, value: newest?.label ?? texts.none },
        { name: texts.from, value: lowest ? price(lowest) : texts.none },
        { name: texts.holders, value: holders === undefined ? texts.none : number(holders) },
      ]}
      action={
        may('buyers:read') && (
          <LinkButton look="cell" to={paths.workshop.holders.to({}, { kitId: kit.id })}>
            {texts.seeHolders}
          </LinkButton>
        )
      }
    />
  );
}

/** One kit: its revisions, licences and words. */
export function WorkshopKitPage() {
  const { kitId = '' } = useParams();
  const { may } = useSession();
  const { data: kit, fault, mutate } = useEndpoint('GET /workshop/kits/:kitId', { params: { kitId } });
  const voices = useVoices(kit);
  if (!kit)
    return (
      <Band>
        {fault ? (
          <Fault what={texts.notFound} fault={fault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );
  return (
    <KitColour palette={kit.colour}>
      <PageTitle title={kit.name} />
      <SplitSheet
        asideLabel={texts.shop}
        main={
          <>
            <Text isSoft>
              <TextLink to={paths.workshop.kits.to()}>{texts.kits}</TextLink>
            </Text>
            <Heading level={1}>{kit.name}</Heading>
            {kit.tagline && (
              <Text look="lead" marginTop="2">
                {kit.tagline}
              </Text>
            )}
            <Box as="section" marginTop="8">
              <KitRevisions kit={kit} />
            </Box>
            <Box as="section" marginTop="12">
              <KitLicences kit={kit} />
            </Box>
          </>
        }
        aside={
          <>
            {voices.length > 0 && (
              <Box marginBottom="8">
                <Rank voices={voices} maxHeightPx={140} />
              </Box>
            )}
            <ListingSwitch kit={kit} />
          </>
        }
        block={<KitBlock kit={kit} />}
      />
      {may('kits:write') && (
        <Band>
          <Heading level={2} look="section">
            {texts.words}
          </Heading>
          <Text isSoft marginBottom="5">
            {texts.wordsLead}
          </Text>
          <Box maxWidth="62rem">
            <Suspense fallback={<SkeletonLines lines={6} />}>
              <KitWordsForm key={kit.id} kit={kit} voices={voices} />
            </Suspense>
          </Box>
        </Band>
      )}
    </KitColour>
  );
}
