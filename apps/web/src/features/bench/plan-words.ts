import type { PrintSheetPart, PrintSpecification } from '@windchest/contracts';
import { materialNamed, usual } from '@windchest/plates';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { counted, grams, hoursRange, millimetres, number, price } from '../../lib/format.js';
import { type FilamentNeed, sumOf } from './plan-figures.js';
import type { PartOnPrinter } from './plates-work.js';

const unique = (words: readonly string[]) => [...new Set(words)];

export interface SummaryFacts {
  plates: number;
  /** Of how many parts there is at least one piece on a plate, and of how many there are. */
  partsOn: number;
  partsInAll: number;
  hours: { low: number; high: number };
  needs: readonly FilamentNeed[];
  currency: string;
}

/** `4 plates, 31–62 h, 640 g of filament, about €14.70`; what nobody knows is left out. */
export function summaryWords({ plates, partsOn, partsInAll, hours, needs, currency }: SummaryFacts): string {
  const massG = needs.every(({ weight }) => weight) ? sumOf(needs.map(({ weight }) => weight?.massG)) : null;
  const minor = needs.every(({ costMinor }) => costMinor !== null)
    ? sumOf(needs.map(({ costMinor }) => costMinor))
    : null;
  const platesWords = counted(plates, texts.onePlate, texts.manyPlates);
  return texts.summary(
    partsOn === partsInAll ? platesWords : texts.forSome(platesWords, number(partsOn), number(partsInAll)),
    hours.high > 0 ? hoursRange(hours.low, hours.high) : null,
    massG === null ? null : grams(massG),
    minor === null ? null : price({ minor, currency }),
  );
}

/** What has to be known about the filaments figured with: another material, no weight, no price. */
export function filamentNotes(needs: readonly FilamentNeed[]): string[] {
  return [
    ...needs
      .filter(({ weight, makers, printedIn }) => weight && makers.toLowerCase() !== printedIn.toLowerCase())
      .map(({ makers, printedIn }) => texts.otherMaterial(makers, printedIn)),
    ...unique(
      needs
        .filter(({ weight }) => !weight)
        .map(({ printedIn, makers }) => texts.noDensity(printedIn, makers)),
    ),
    ...unique(
      needs
        .filter(({ weight, costMinor }) => weight && costMinor === null)
        .map(({ printedIn }) => texts.noPrice(printedIn)),
    ),
  ];
}

export interface CertaintyFacts {
  /** Of what lies on plates. */
  parts: readonly PartOnPrinter[];
  specs: readonly PrintSpecification[];
  needs: readonly FilamentNeed[];
}

/** How far the figures may be off, and what is not in them. */
export function certaintyWords({ parts, specs, needs }: CertaintyFacts): string[] {
  const percents = parts.flatMap(({ estimate }) => (estimate ? [estimate.mayBeOffPercent] : []));
  const weights = unique(needs.map(({ printedIn }) => printedIn)).flatMap((name) => {
    const known = materialNamed(name);
    return known ? [texts.weightOf(known.name, number(known.densityGPerCm3, 2))] : [];
  });
  const without = parts.filter(({ estimate }) => !estimate).map(({ code }) => code);
  return [
    ...(percents.length > 0 && weights.length > 0 ? [texts.offBy(number(Math.max(...percents)))] : []),
    ...(weights.length > 0
      ? [texts.plainWeight(weights.join(', ')), texts.filamentDiameter(millimetres(usual.filamentMm, 2))]
      : []),
    ...(percents.length > 0 ? [texts.hoursSpan] : []),
    specs.some(({ supports }) => supports !== 'none') ? `${texts.leftOut} ${texts.supports}` : texts.leftOut,
    ...(without.length > 0 ? [texts.noEstimate(without.join(', '))] : []),
  ];
}

/** The settings in force for some parts. */
export const specsOf = (parts: readonly PrintSheetPart[], kit: PrintSpecification): PrintSpecification[] =>
  parts.map(({ printSpec }) => printSpec ?? kit);
