import { Box } from '@chakra-ui/react/box';
import type { PrinterCardFields, PrintSheetPart, PrintSpecification } from '@windchest/contracts';
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
import type { PlateLayout } from './layout-fields.js';
import type { PlatesAnswer } from './plates-work.js';

export interface PlanSectionsProps {
  answer: PlatesAnswer;
  parts: readonly PrintSheetPart[];
  unmeasured: readonly string[];
  printSpec: PrintSpecification;
  printer: PrinterCardFields;
  layout: PlateLayout;
  currency: string;
  layoutFields: ReactNode;
}

/** Plates, and what those on them take. */
export function PlanSections(props: PlanSectionsProps) {
  const { answer, parts, unmeasured, printSpec, printer, layout, currency, layoutFields } = props;
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
          {layoutFields}
        </>
      )}
      <PlatePages
        plates={answer.plates}
        bed={printer.bed}
        marginMm={layout.marginMm}
        gapMm={layout.gapMm}
        settings={layoutFields}
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
