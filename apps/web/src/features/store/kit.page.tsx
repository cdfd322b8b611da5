import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { kitTexts } from '../../config/texts/kit.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { usePredictedRank } from '../bench/use-predicted-rank.js';
import { KitSections, type KitSectionsProps } from './kit-sections.js';
import { KitSheet } from './kit-sheet.js';

const NoKit = () => (
  <Band>
    <PageTitle title={kitTexts.unknown} />
    <Heading level={1}>{kitTexts.unknown}</Heading>
    <Text look="lead" marginTop="3" marginBottom="6">
      {kitTexts.unknownDetail}
    </Text>
    <LinkButton to={paths.home.to()}>{kitTexts.seeKits}</LinkButton>
  </Band>
);

function Kit({ kit, parts }: Omit<KitSectionsProps, 'inRoom'>) {
  const inRoom = usePredictedRank(kit.rank, kit.room);
  return (
    <>
      <KitSheet kit={kit} inRoom={inRoom} />
      <KitSections kit={kit} parts={parts} inRoom={inRoom} />
    </>
  );
}

/** One kit: to see, to hear, to measure against one's printer, to buy. */
export function KitPage() {
  const { slug = '' } = useParams();
  const input = { params: { slug } };
  const { data: kit, fault, mutate } = useEndpoint('GET /kits/:slug', input);
  const parts = useEndpoint('GET /kits/:slug/parts', input);

  if (kit)
    return (
      <KitColour palette={kit.colour} key={kit.slug}>
        <PageTitle title={kit.name} />
        <Kit kit={kit} parts={parts} />
      </KitColour>
    );
  // A slug nobody could have made is refused as such; to a reader it is an address like any other.
  if (fault?.code === 'not-found' || fault?.code === 'validation-failed') return <NoKit />;
  return (
    <Band tone="sheet" minHeight="32rem">
      <PageTitle title={kitTexts.loading} />
      {fault ? (
        <>
          <Heading level={1} marginBottom="6">
            {kitTexts.failed}
          </Heading>
          <Fault level={2} fault={fault} onAgain={() => void mutate()} />
        </>
      ) : (
        <>
          <Heading level={1} marginBottom="6">
            {kitTexts.loading}
          </Heading>
          <SkeletonLines lines={5} />
        </>
      )}
    </Band>
  );
}
