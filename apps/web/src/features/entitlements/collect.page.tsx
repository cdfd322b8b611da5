import { Box } from '@chakra-ui/react/box';
import type { Collection } from '@windchest/contracts';
import { useParams } from 'react-router-dom';
import { collectTexts } from '../../config/texts/shelf.js';
import { date, number } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { CollectAside } from './collect-aside.js';
import { CollectKit } from './collect-kit.js';
import { FreshLink } from './fresh-link.js';
import { LostLinkForm } from './lost-link-form.js';
import { useLinkDownload } from './use-download.js';

function Files({ token, collection }: { token: string; collection: Collection }) {
  const download = useLinkDownload(token);
  const { state, kits } = collection;
  const isOpen = state === 'open';
  const words = collectTexts.states[state];
  return (
    <SplitSheet
      asideLabel={collectTexts.aside}
      main={
        <>
          <PageTitle title={collectTexts.title} />
          <Heading level={1}>{isOpen ? collectTexts.title : words.title}</Heading>
          <Text look="lead" marginTop="2" marginBottom="5">
            {isOpen ? collectTexts.lead(kits.length) : words.detail}
          </Text>
          {!isOpen && state !== 'ended' && state !== 'suspended' && (
            <Box marginBottom="7">
              <FreshLink token={token} isMain />
            </Box>
          )}
          {isOpen && download.fault && (
            <Fault level={2} what={collectTexts.getFailed} fault={download.fault} />
          )}
          {kits.length > 0 && (
            <Box as="ul" listStyle="none" borderTopWidth="1px" borderColor="hairline">
              {kits.map((kit) => (
                <CollectKit
                  key={kit.slug + kit.licenceName}
                  kit={kit}
                  download={isOpen ? download : undefined}
                />
              ))}
            </Box>
          )}
        </>
      }
      aside={<CollectAside token={token} isOpen={isOpen} />}
      block={
        <TitleBlock
          columns={2}
          fields={[
            { name: collectTexts.orderName, value: collection.orderNumber },
            { name: collectTexts.stateName, value: collectTexts.stateWords[state] },
            { name: collectTexts.usesLeft, value: number(collection.usesLeft) },
            {
              name: state === 'expired' ? collectTexts.endedOn : collectTexts.goodUntil,
              value: date(collection.expiresAt),
            },
          ]}
        />
      }
    />
  );
}

/** What a mailed link opens. Opening it uses nothing up. */
export function CollectPage() {
  const { token = '' } = useParams();
  const { data, fault, mutate } = useEndpoint('GET /collect/:token', { params: { token } });
  if (data) return <Files token={token} collection={data} />;
  if (fault?.code === 'not-found')
    return (
      <Band>
        <PageTitle title={collectTexts.unknown} />
        <Heading level={1}>{collectTexts.unknown}</Heading>
        <Text look="lead" marginTop="2" marginBottom="8">
          {collectTexts.unknownDetail}
        </Text>
        <LostLinkForm />
      </Band>
    );
  return (
    <Band>
      <PageTitle title={collectTexts.title} />
      <Heading level={1} marginBottom="6">
        {fault ? collectTexts.failed : collectTexts.title}
      </Heading>
      {fault ? <Fault level={2} fault={fault} onAgain={() => void mutate()} /> : <SkeletonLines lines={4} />}
    </Band>
  );
}
