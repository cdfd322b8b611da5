import { Box } from '@chakra-ui/react/box';
import type { ShelfKit } from '@windchest/contracts';
import { useState } from 'react';
import { paths } from '../../config/paths.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { date } from '../../lib/format.js';
import { TextLink } from '../../ui/link.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { SplitSheet } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { TitleBlock } from '../../ui/title-block.js';
import { PrintedDialog } from './printed-dialog.js';
import { ReprintSection } from './reprint-section.js';
import { ShelfKitActions } from './shelf-kit-actions.js';
import { ShelfKitAnswer } from './shelf-kit-answer.js';
import { ShelfKitHeadline } from './shelf-kit-headline.js';
import { ShelfKitSections } from './shelf-kit-sections.js';
import { sourceWords } from './source-words.js';
import { useShelfDownload } from './use-download.js';
import { WatchRevisions } from './watch-revisions.js';

/** A download that has not ended yet is looked after for this long, so that the page learns what is held. */
const watchedMs = 10 * 60_000;
const hasRunningDownload = (kit: ShelfKit | undefined): boolean =>
  kit?.downloads.some((one) => !one.isComplete && Date.now() - Date.parse(one.at) < watchedMs) ?? false;

/** Why a revision is handed out no more, and what to do. */
const WithdrawnNotice = ({
  revision,
  newest,
}: {
  revision: ShelfKit['newest'];
  newest: ShelfKit['newest'];
}) => (
  <Notice tone="warn" title={shelfKitTexts.withdrawnTitle(revision.label)}>
    {revision.withdrawnReason && <Text marginBottom="1">“{revision.withdrawnReason}”</Text>}
    <Text>
      {newest.isWithdrawn
        ? shelfKitTexts.withdrawnWait(revision.label)
        : shelfKitTexts.withdrawnTake(revision.label, newest.label)}
    </Text>
  </Notice>
);

function Kit({ kit }: { kit: ShelfKit }) {
  const download = useShelfDownload();
  const [printed, setPrinted] = useState<ShelfKit['newest']>();
  const { held, newest } = kit;
  return (
    <KitColour palette={kit.colour}>
      <SplitSheet
        asideLabel={shelfKitTexts.actions}
        main={
          <>
            <Heading level={1} look="display" overflowWrap="anywhere">
              {kit.name}
            </Heading>
            <ShelfKitHeadline kit={kit} />
            {(held?.isWithdrawn || newest.isWithdrawn) && (
              <Box marginTop="5">
                <WithdrawnNotice revision={held?.isWithdrawn ? held : newest} newest={newest} />
              </Box>
            )}
            {kit.newerNotIncluded && (
              <Box marginTop="5">
                <Notice title={shelfKitTexts.notIncludedTitle(kit.newerNotIncluded)}>
                  {shelfKitTexts.notIncluded(newest.label)}{' '}
                  <TextLink to={paths.support.to()}>{shelfKitTexts.pledgeAgain}</TextLink>{' '}
                  <TextLink to={paths.kit.to({ slug: kit.slug })}>{shelfKitTexts.buyKit}</TextLink>
                </Notice>
              </Box>
            )}
            <ReprintSection kit={kit} download={download} />
          </>
        }
        aside={
          <>
            <ShelfKitActions kit={kit} download={download} onPrinted={setPrinted} />
            <WatchRevisions slug={kit.slug} />
          </>
        }
        block={
          <TitleBlock
            columns={2}
            fields={[
              { name: shelfKitTexts.blockHold, value: held?.label ?? shelfKitTexts.blockNothing },
              {
                name: shelfKitTexts.blockNewest,
                value: shelfKitTexts.newestOf(newest.label, date(newest.releasedAt)),
              },
              {
                name: shelfKitTexts.blockSource,
                value: sourceWords(kit).map((words) => <Box key={words}>{words}</Box>),
              },
            ]}
          />
        }
      />
      <ShelfKitSections kit={kit} download={download} onPrinted={setPrinted} />
      <PrintedDialog slug={kit.slug} revision={printed} onClose={() => setPrinted(undefined)} />
    </KitColour>
  );
}

/** One kit on the shelf: the revision held, the newest one, and what to reprint between them. */
export const ShelfKitPage = () => (
  <ShelfKitAnswer
    address={(slug) => paths.shelfKit.to({ slug })}
    askAgainMs={(kit) => (hasRunningDownload(kit) ? 4000 : 0)}
  >
    {(kit) => (
      <>
        <PageTitle title={kit.name} />
        <Kit kit={kit} />
      </>
    )}
  </ShelfKitAnswer>
);
