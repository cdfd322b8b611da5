import { Box } from '@chakra-ui/react/box';
import type { KitPage } from '@windchest/contracts';
import { kitTexts } from '../../config/texts/kit.js';
import { date } from '../../lib/format.js';
import { Details } from '../../ui/details.js';
import { Markdown } from '../../ui/markdown.js';
import { Heading, Text } from '../../ui/text.js';

type Revision = KitPage['revisions'][number];

const RevisionEntry = ({ revision }: { revision: Revision }) => (
  <Box
    as="article"
    paddingBottom="5"
    // Headings of the notes are lesser than the revision’s own.
    css={{ '& h3 ~ div h3': { fontSize: 'md' } }}
  >
    <Heading level={3} look="body" marginBottom="2">
      {revision.label}
      <Box as="span" fontWeight="normal" color="ink.soft" marginLeft="2.5">
        {date(revision.releasedAt)}
      </Box>
    </Heading>
    {revision.changeNotes.trim() ? (
      <Markdown text={revision.changeNotes} />
    ) : (
      <Text isSoft>{kitTexts.noNotes}</Text>
    )}
  </Box>
);

/** Released revisions, newest first, each with what changed. */
export function RevisionList({ revisions }: { revisions: readonly Revision[] }) {
  const [newest, ...earlier] = revisions;
  return (
    <>
      {newest && <RevisionEntry revision={newest} />}
      {earlier.length > 0 && (
        <Details summary={kitTexts.earlier(earlier.length)}>
          {earlier.map((revision) => (
            <RevisionEntry key={revision.label} revision={revision} />
          ))}
        </Details>
      )}
    </>
  );
}
