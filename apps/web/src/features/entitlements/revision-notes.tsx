import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { ShelfKit } from '@windchest/contracts';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { bytes, date } from '../../lib/format.js';
import { Button } from '../../ui/button.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Heading, Text } from '../../ui/text.js';
import { chosenBundle } from './chosen-bundle.js';
import { SmallMarkdown } from './small-markdown.js';
import type { Download } from './use-download.js';

const Details = chakra('details', { base: { borderTopWidth: '1px', borderColor: 'hairline' } });
const Summary = chakra('summary', {
  base: {
    display: 'flex',
    flexWrap: 'wrap',
    alignItems: 'baseline',
    columnGap: '4',
    paddingBlock: '3',
    cursor: 'pointer',
    listStyle: 'none',
    '&::-webkit-details-marker': { display: 'none' },
    _before: { content: '"+"', width: '1ch', fontWeight: 'semibold', marginRight: '-2' },
    '[open] > &': { _before: { content: '"−"' } },
  },
});

export interface RevisionNotesProps {
  kit: ShelfKit;
  download: Download;
  onPrinted: (revision: ShelfKit['newest']) => void;
}

/** Each revision with what changed in it; those newer than the one held stand open. */
export function RevisionNotes({ kit, download, onPrinted }: RevisionNotesProps) {
  const heldAt = kit.revisions.findIndex((one) => one.id === kit.held?.id);
  return (
    <Box borderBottomWidth="1px" borderColor="hairline">
      {kit.revisions.map((revision, at) => {
        const isHeld = revision.id === kit.held?.id;
        const { wish, bytes: size, clearance } = chosenBundle(kit, revision);
        return (
          <Details key={revision.id} open={at === 0 || at < heldAt}>
            <Summary>
              <Heading level={3} look="subsection">
                {revision.label}
              </Heading>
              <Box as="span" color="ink.soft">
                {date(revision.releasedAt)}
              </Box>
              {isHeld && <StatusMark state="ok">{shelfKitTexts.youHold}</StatusMark>}
              {revision.isWithdrawn && <StatusMark state="warn">{shelfKitTexts.isWithdrawn}</StatusMark>}
            </Summary>
            <Box paddingLeft={{ md: '6' }} paddingBottom="5">
              {revision.changeNotes.trim() ? (
                <SmallMarkdown text={revision.changeNotes} />
              ) : (
                <Text isSoft>{shelfKitTexts.noNotes}</Text>
              )}
              <Box display="flex" flexWrap="wrap" gap="3" marginTop="4">
                {!revision.isWithdrawn && (
                  <Button
                    look="outline"
                    size="sm"
                    onClick={() => void download.start(wish)}
                    isBusy={download.isStarting(wish)}
                    busyWords={shelfKitTexts.getting}
                  >
                    {shelfKitTexts.getRevision(
                      revision.label,
                      clearance ? clearanceTexts.signs[clearance] : undefined,
                    )}{' '}
                    · {bytes(size)}
                  </Button>
                )}
                {!isHeld && (
                  <Button look="outline" size="sm" onClick={() => onPrinted(revision)}>
                    {shelfKitTexts.printed(revision.label)}
                  </Button>
                )}
              </Box>
            </Box>
          </Details>
        );
      })}
    </Box>
  );
}
