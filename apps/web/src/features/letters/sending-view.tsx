import { Box } from '@chakra-ui/react/box';
import type { Letter } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { leftOutTexts, reachTexts, sendingTexts as texts } from '../../config/texts/workshop-letters.js';
import { dateTime, number } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { Facts } from '../../ui/facts.js';
import { TextLink } from '../../ui/link.js';
import { Markdown } from '../../ui/markdown.js';
import { Progress } from '../../ui/progress.js';
import { Heading, Text } from '../../ui/text.js';
import { RecipientsTable } from './recipients-table.js';
import { SteerLetter } from './steer-letter.js';

/** What stands beside the progress, in a sentence. */
function standing(letter: Letter): string {
  const { state, sendAt, finishedAt } = letter;
  if (state === 'scheduled')
    return sendAt && Date.parse(sendAt) > Date.now() ? texts.waits(dateTime(sendAt)) : texts.gathering;
  if (state === 'paused') return texts.paused;
  if (state === 'sent' && finishedAt) return texts.done(dateTime(finishedAt));
  if (state === 'cancelled' && finishedAt) return texts.broken(dateTime(finishedAt));
  return texts.pace(letter.perMinute);
}

/** A letter on its way or sent: how far, to whom, to whom not and why. */
export function SendingView({ letter }: { letter: Letter }) {
  const { may } = useSession();
  const { counts } = letter;
  const done = counts.sent + counts.refused + counts.bounced;
  const all = done + counts.queued + counts.handedOver;
  return (
    <>
      {letter.state !== 'scheduled' && (
        <Box maxWidth="measure" marginBottom="4">
          <Progress label={texts.progress} done={all === 0 ? 1 : done / all} words={texts.words(done, all)} />
        </Box>
      )}
      <Text role="status">{standing(letter)}</Text>
      {letter.kitName && letter.revisionLabel && (
        <Text look="small" isSoft>
          {texts.about(letter.kitName, letter.revisionLabel)}
        </Text>
      )}
      <Box marginBlock="4">
        <Facts
          facts={[
            { value: number(counts.sent), name: texts.counts.sent },
            { value: number(counts.queued + counts.handedOver), name: texts.counts.queued },
            { value: number(counts.refused), name: texts.counts.refused },
            { value: number(counts.bounced), name: texts.counts.bounced },
            { value: number(counts.leftOut), name: texts.counts.leftOut },
          ]}
        />
      </Box>
      {may('letters:send') && <SteerLetter letter={letter} />}
      {letter.kind === 'news' && letter.state === 'sent' && letter.slug && (
        <Text marginTop="3">
          <TextLink to={paths.letter.to({ slug: letter.slug })}>{texts.archive}</TextLink>
        </Text>
      )}
      {letter.leftOut.length > 0 && (
        <Box as="section" marginTop="6">
          <Heading level={2} look="subsection" marginBottom="2">
            {texts.leftOutTitle}
          </Heading>
          <Box as="ul" listStyle="none">
            {letter.leftOut.map(({ reason, count }) => (
              <li key={reason}>{reachTexts.reason(count, leftOutTexts[reason])}</li>
            ))}
          </Box>
        </Box>
      )}
      <Box as="section" marginTop="8">
        <Heading level={2} marginBottom="4">
          {texts.recipients}
        </Heading>
        <RecipientsTable letter={letter} />
      </Box>
      <Box as="section" marginTop="8" maxWidth="measure">
        <Heading level={2} marginBottom="3">
          {texts.read}
        </Heading>
        <Markdown text={letter.body} />
      </Box>
    </>
  );
}
