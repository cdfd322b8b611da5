import { Box } from '@chakra-ui/react/box';
import type { RankVoice } from '@windchest/contracts';
import { tunerTexts as texts } from '../../../config/texts/tuner.js';
import { number } from '../../../lib/format.js';
import { Details } from '../../../ui/details.js';
import { Sign } from '../../../ui/sign.js';
import { type Column, HairlineTable } from '../../../ui/table/hairline-table.js';
import { Heading, Text } from '../../../ui/text.js';
import { noteName } from '../drawn-voices.js';
import type { Foreseen } from './judge.js';
import type { Tuned } from './use-tuner.js';
import { offWords, verdictWords } from './verdict-words.js';

/** What calculation said of the print, and how far it may be trusted. */
export function ForeseenNote({ foreseen }: { foreseen: Foreseen | undefined }) {
  if (!foreseen) return <Text isSoft>{texts.beyondFormulas}</Text>;
  const off = Math.abs(foreseen.cents) < 0.5 ? texts.foreseenOn : offWords(foreseen.cents);
  return (
    <Box display="grid" gap="2">
      <Text isSoft>{texts.foreseen(off, texts.cents(number(foreseen.uncertaintyCents)))}</Text>
      <Details summary={texts.doubts} gap="2">
        <Box as="ul" listStyle="none" display="grid" gap="1" fontSize="sm" color="ink.soft">
          {foreseen.terms.map(({ from, cents }) => (
            <li key={from}>{texts.doubt(from, texts.cents(number(cents, 1)))}</li>
          ))}
        </Box>
      </Details>
    </Box>
  );
}

interface Row extends RankVoice {
  tuned: Tuned;
}

export interface HeardTableProps {
  rank: readonly RankVoice[];
  soFar: ReadonlyMap<string, Tuned>;
  declaredCents: number;
}

/** Every voice heard well on this visit, in the order of the rank. */
export function HeardTable({ rank, soFar, declaredCents }: HeardTableProps) {
  const rows = rank.flatMap((voice): Row[] => {
    const tuned = soFar.get(voice.code);
    return tuned ? [{ ...voice, tuned }] : [];
  });
  if (rows.length === 0) return null;
  const columns: Column<Row>[] = [
    { key: 'note', header: texts.columns.note, isHeading: true, cell: ({ voice }) => noteName(voice.note) },
    { key: 'code', header: texts.columns.code, cell: ({ code }) => code },
    {
      key: 'off',
      header: texts.columns.off,
      cell: ({ tuned: { verdict, reading } }) =>
        'cents' in verdict
          ? texts.offBy(offWords(verdict.cents), number(Math.max(0.1, reading.spreadCents), 1))
          : '',
    },
    {
      key: 'todo',
      header: texts.columns.todo,
      cell: ({ tuned: { verdict, reading, judging } }) =>
        verdictWords(verdict, reading, judging, declaredCents).todo,
    },
  ];
  return (
    <Box as="section">
      <Heading level={2}>{texts.soFar}</Heading>
      <Text isSoft marginBottom="3">
        {texts.soFarDetail}
      </Text>
      <HairlineTable caption={texts.soFarCaption} columns={columns} rows={rows} rowKey={(row) => row.code} />
    </Box>
  );
}

export const TunerCautions = () => (
  <Box as="section">
    <Heading level={2} marginBottom="3">
      {texts.cautions}
    </Heading>
    <Box as="ul" listStyle="none" display="grid" gap="2" maxWidth="measure">
      {texts.cautionList.map((caution) => (
        <Box as="li" key={caution} display="flex" gap="3">
          <Sign name="warn" color="warn" marginTop="0.32em" />
          <span>{caution}</span>
        </Box>
      ))}
    </Box>
  </Box>
);
