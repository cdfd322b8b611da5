import { Box } from '@chakra-ui/react/box';
import type { PrinterCardFields } from '@windchest/contracts';
import { type ReactNode, useMemo, useState } from 'react';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { Details } from '../../ui/details.js';
import { Heading, Text } from '../../ui/text.js';
import { FilamentTable, type SpoolSizeG } from './filament-table.js';
import { FitsTable } from './fits-table.js';
import {
  filamentNeeds,
  hoursOf,
  makersMaterial,
  type PiecesOfPart,
  piecesOn,
  sumOf,
  usualFilament,
  weightOf,
} from './plan-figures.js';
import { certaintyWords, filamentNotes, specsOf, summaryWords } from './plan-words.js';
import { PlatePages } from './plate-pages.js';
import type { PlatesAnswer, PlatesQuestion } from './plates-work.js';

export interface PlanSectionsProps {
  answer: PlatesAnswer;
  question: PlatesQuestion;
  unmeasured: readonly string[];
  printer: PrinterCardFields;
  currency: string;
  /** What changes the plates, to stand under them. */
  settings: ReactNode;
}

/** Plates, and what those on them take. */
export function PlanSections(props: PlanSectionsProps) {
  const { answer, question, unmeasured, printer, currency, settings } = props;
  const { parts, printSpec } = question;
  const [chosen, setChosen] = useState<Record<string, string>>({});
  const [spoolG, setSpoolG] = useState<SpoolSizeG>(1000);
  const estimates = useMemo(
    () => new Map(answer.parts.flatMap(({ code, estimate }) => (estimate ? [[code, estimate]] : []))),
    [answer],
  );
  const pieces = useMemo(() => piecesOn(answer.plates), [answer]);
  const card = printer.materials;
  const needsOf = (some: readonly PiecesOfPart[]) =>
    filamentNeeds({ pieces: some, parts, estimates, printSpec, card, chosen, spoolG });
  const needs = needsOf(pieces);
  const onPlates = new Set(pieces.map(({ code }) => code));
  const rows = parts.flatMap((part) => {
    const on = answer.parts.find(({ code }) => code === part.code);
    if (!on) return [];
    const makers = makersMaterial(part, printSpec);
    const printedIn = chosen[makers] ?? usualFilament(makers, printSpec, card);
    const massG = on.estimate && (weightOf(on.estimate.volumeMm3, printedIn)?.massG ?? null);
    return [{ part, on, massG }];
  });

  return (
    <>
      {answer.plates.length > 0 ? (
        <Heading level={3} look="section">
          {summaryWords({
            plates: answer.plates.length,
            partsOn: onPlates.size,
            partsInAll: parts.length + unmeasured.length,
            hours: hoursOf(pieces, estimates),
            needs,
            currency,
          })}
        </Heading>
      ) : (
        <>
          <Text>{texts.nothing}</Text>
          {settings}
        </>
      )}
      <PlatePages
        plates={answer.plates}
        bed={question.bed}
        marginMm={question.marginMm}
        gapMm={question.gapMm}
        settings={settings}
        nameOf={(code) => parts.find((part) => part.code === code)?.name ?? ''}
        hoursOf={(some) => hoursOf(some, estimates)}
        massOf={(some) => {
          const masses = needsOf(some).map(({ weight }) => weight?.massG ?? null);
          return masses.includes(null) ? null : sumOf(masses);
        }}
      />
      {needs.length > 0 && (
        <Box>
          <Heading level={3} look="subsection" marginBottom="2">
            {texts.filament}
          </Heading>
          <FilamentTable
            needs={needs}
            card={card}
            currency={currency}
            spoolG={spoolG}
            onSpool={setSpoolG}
            onChoose={(makers, printedIn) => setChosen((before) => ({ ...before, [makers]: printedIn }))}
          />
          {filamentNotes(needs).map((note) => (
            <Text key={note} isSoft marginTop="3">
              {note}
            </Text>
          ))}
        </Box>
      )}
      {answer.plates.length > 0 && (
        <Box>
          <Heading level={3} look="body" marginBottom="1">
            {texts.howSure}
          </Heading>
          <Text look="small" isSoft>
            {certaintyWords({
              parts: answer.parts.filter(({ code }) => onPlates.has(code)),
              specs: specsOf(
                parts.filter(({ code }) => onPlates.has(code)),
                printSpec,
              ),
              needs,
            }).join(' ')}
          </Text>
        </Box>
      )}
      {rows.length > 0 && (
        <Details summary={texts.everyPart(rows.length)}>
          <FitsTable rows={rows} />
        </Details>
      )}
    </>
  );
}
