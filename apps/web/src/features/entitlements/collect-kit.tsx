import { Box } from '@chakra-ui/react/box';
import type { Collection } from '@windchest/contracts';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { collectTexts } from '../../config/texts/shelf.js';
import { bytes, date } from '../../lib/format.js';
import { Button } from '../../ui/button.js';
import { CopyButton } from '../../ui/copy-button.js';
import { FilamentSwatch } from '../../ui/drawing/filament-swatch.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { VisuallyHidden } from '../../ui/visually-hidden.js';
import type { Download } from './use-download.js';

export interface CollectKitProps {
  kit: Collection['kits'][number];
  /** Left out where the link is closed. */
  download?: Download;
}

/** The hash in the same letters as checksum tools print it, and the verb that copies it. */
const Checksum = ({ kit }: { kit: CollectKitProps['kit'] }) => (
  <Box marginTop="4" fontSize="sm">
    <Box color="ink.soft">
      {kit.newest.bundles.length > 0 ? collectTexts.checksumOfAll : collectTexts.checksum}
    </Box>
    <Box display="flex" flexWrap="wrap" columnGap="4" rowGap="2" alignItems="center">
      <Box as="code" fontFamily="mono" fontSize="0.9em" overflowWrap="anywhere" minWidth="0" flex="0 1 auto">
        {kit.newest.bundleSha256}
      </Box>
      <CopyButton
        text={kit.newest.bundleSha256}
        label={collectTexts.copyChecksum}
        look="plain"
        aria-description={collectTexts.of(kit.name)}
      />
    </Box>
  </Box>
);

/** For those who know which clearance their printer needs. */
const OneClearance = ({ kit, download }: Required<CollectKitProps>) => (
  <Box marginTop="4">
    <Text look="small" isSoft>
      {collectTexts.clearances}
    </Text>
    <Box display="flex" flexWrap="wrap" gap="2" marginTop="2">
      {kit.newest.bundles.map(({ clearance, bytes: size }) => {
        const wish = { kitSlug: kit.slug, revisionId: kit.newest.id, clearance };
        return (
          <Button
            key={clearance}
            look="outline"
            size="sm"
            onClick={() => void download.start(wish)}
            isBusy={download.isStarting(wish)}
            busyWords={collectTexts.getting}
          >
            {collectTexts.getOne(clearanceTexts.named(clearance))} · {bytes(size)}
          </Button>
        );
      })}
    </Box>
  </Box>
);

/** One kit behind a mailed link. */
export function CollectKit({ kit, download }: CollectKitProps) {
  const wish = { kitSlug: kit.slug, revisionId: kit.newest.id };
  return (
    <KitColour
      as="li"
      palette={kit.colour}
      display="grid"
      gridTemplateColumns="auto minmax(0, 1fr)"
      columnGap={{ base: '4', md: '6' }}
      paddingBlock="6"
      borderBottomWidth="1px"
      borderColor="hairline"
    >
      <FilamentSwatch alignSelf="stretch" width={{ base: '0.75rem', md: '1.125rem' }} />
      <Box minWidth="0">
        <Box
          display="flex"
          flexWrap="wrap"
          justifyContent="space-between"
          alignItems="flex-start"
          columnGap="6"
          rowGap="4"
        >
          <Box minWidth="0" flex="1 1 14rem">
            <Heading level={2} look="section" overflowWrap="anywhere">
              {kit.name}
            </Heading>
            <Text isSoft>
              {[kit.newest.label, date(kit.newest.releasedAt), kit.licenceName].filter(Boolean).join(' · ')}
            </Text>
          </Box>
          {download && (
            <Button
              width={{ base: 'full', sm: 'auto' }}
              onClick={() => void download.start(wish)}
              isBusy={download.isStarting(wish)}
              busyWords={collectTexts.getting}
            >
              <span>
                {collectTexts.get}
                <VisuallyHidden> {collectTexts.of(kit.name)}</VisuallyHidden>
                <Box as="span" fontWeight="normal">
                  {' '}
                  · {bytes(kit.newest.bundleBytes)}
                </Box>
              </span>
            </Button>
          )}
        </Box>
        {download && kit.newest.bundles.length > 0 && <OneClearance kit={kit} download={download} />}
        {download && <Checksum kit={kit} />}
      </Box>
    </KitColour>
  );
}
