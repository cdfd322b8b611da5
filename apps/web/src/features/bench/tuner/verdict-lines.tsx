import { Box } from '@chakra-ui/react/box';
import { kindWords, tunerTexts as texts } from '../../../config/texts/tuner.js';
import { number } from '../../../lib/format.js';
import { Button } from '../../../ui/button.js';
import { Heading, Text } from '../../../ui/text.js';
import { VisuallyHidden } from '../../../ui/visually-hidden.js';
import { noteName } from '../drawn-voices.js';
import type { Listening } from './listening.js';
import type { Tuned } from './use-tuner.js';
import { useSettled } from './use-settled.js';
import { verdictWords } from './verdict-words.js';

export interface VerdictLinesProps {
  tuned: Tuned | undefined;
  listening: Listening;
  source: 'none' | 'microphone' | 'recording';
  kind: keyof typeof kindWords;
  declaredCents: number;
  onChoose: (code: string) => void;
}

/** What is in the air while nothing is read yet. */
function waitingWords({ listening, source, kind }: VerdictLinesProps): [string, string] {
  if (source === 'none') return [texts.waiting, texts.waitingDetail];
  if (source === 'recording') {
    const hears = listening.now === 'quiet' || listening.now === 'noise' ? listening.now : undefined;
    return hears ? [texts.recordingHears[hears], ''] : [texts.now.waiting, ''];
  }
  if (listening.now === 'waiting') return [texts.now.waiting, kindWords[kind].sound];
  return listening.now === 'pitch'
    ? [texts.now.pitch, '']
    : [texts.now[listening.now], kindWords[kind].sound];
}

/** What was heard, what it means, and what to do. Keeps its height, so that nothing jumps while one listens. */
export function VerdictLines(props: VerdictLinesProps) {
  const { tuned, listening, source, declaredCents, onChoose } = props;
  const words = tuned && verdictWords(tuned.verdict, tuned.reading, tuned.judging, declaredCents);
  const [title, detail] = words ? [words.headline, words.todo] : waitingWords(props);
  const told = useSettled(`${title} ${detail}`);
  const isPast = source === 'microphone' && listening.now !== 'pitch';
  const { other } = words ?? {};
  return (
    <Box minHeight={{ base: '14rem', md: '10.5rem' }} marginTop="3">
      <VisuallyHidden role="status">{told}</VisuallyHidden>
      <Text look="label" isSoft minHeight="1lh">
        {tuned && isPast ? `${texts.lastHeard}. ${texts.now[listening.now]}` : ' '}
      </Text>
      <Heading level={2} look={tuned ? 'title' : 'section'} marginTop="1">
        {title}
      </Heading>
      <Text look="lead" color="ink" marginTop="1">
        {detail}
      </Text>
      {tuned && (
        <Text isSoft marginTop="2">
          {texts.heard(
            texts.hertz(number(tuned.reading.hz, 1)),
            texts.cents(number(Math.max(0.1, tuned.reading.spreadCents), 1)),
          )}{' '}
          {words?.notes.join(' ')}
        </Text>
      )}
      {other && (
        <Box marginTop="3">
          <Button look="outline" size="sm" onClick={() => onChoose(other.code)}>
            {texts.choose(noteName(other.note))}
          </Button>
        </Box>
      )}
    </Box>
  );
}
