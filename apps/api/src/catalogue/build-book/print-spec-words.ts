import type { PrintSpecification } from '@windchest/contracts';
import type { BookPart } from './build-book.js';
import { numberText } from '../../typesetting/number-text.js';

const supportWords: Record<PrintSpecification['supports'], string> = {
  none: 'None',
  'where-told': 'Where the notes tell',
  everywhere: 'Everywhere',
};

export const orientationWords: Record<BookPart['orientation'], string> = {
  'as-exported': 'As it stands in the file',
  'may-turn': 'May be turned on the bed',
  'may-lie': 'On any side',
};

/** Each setting with its name, in the order a slicer asks for them. */
export const specRows = (spec: PrintSpecification): [name: string, value: string][] => [
  ['Material', spec.material],
  ['Nozzle', `${numberText(spec.nozzleMm, 2)} mm`],
  ['Layer height', `${numberText(spec.layerMm, 2)} mm`],
  ['Perimeters', String(spec.perimeters)],
  ['Top layers', String(spec.topLayers)],
  ['Bottom layers', String(spec.bottomLayers)],
  ['Infill', `${Math.round(spec.infill * 100)} %`],
  ['Supports', supportWords[spec.supports]],
];

/** What a part's own specification has different from the book's: `Perimeters 3, infill 100 %.` and its remarks. */
export const specDifference = (own: PrintSpecification | null, common: PrintSpecification): string => {
  if (!own) return '';
  const usual = new Map(specRows(common));
  const settings = specRows(own)
    .filter(([name, value]) => usual.get(name) !== value)
    .map(([name, value]) => `${name.toLowerCase()} ${name === 'Supports' ? value.toLowerCase() : value}`)
    .join(', ');
  const remarks = own.remarks.trim();
  return [
    ...(settings === '' ? [] : [`${settings.charAt(0).toUpperCase()}${settings.slice(1)}.`]),
    ...(remarks === '' || remarks === common.remarks.trim() ? [] : [remarks]),
  ].join(' ');
};

export interface SpecDifferences {
  /** The letter of a part's settings; empty where it has the book's. */
  readonly letterOf: ReadonlyMap<string, string>;
  /** Each set of settings once. */
  readonly sets: readonly {
    readonly letter: string;
    readonly words: string;
    readonly codes: readonly string[];
  }[];
}

/** Settings that differ, lettered in the order of the parts: many parts of a kit often share one set. */
export const specDifferences = (parts: readonly BookPart[], common: PrintSpecification): SpecDifferences => {
  const codesOf = new Map<string, string[]>();
  for (const { code, printSpec } of parts) {
    const words = specDifference(printSpec, common);
    if (words !== '') codesOf.set(words, [...(codesOf.get(words) ?? []), code]);
  }
  const sets = [...codesOf].map(([words, codes], at) => ({ letter: letterAt(at), words, codes }));
  return {
    sets,
    letterOf: new Map(sets.flatMap(({ letter, codes }) => codes.map((code) => [code, letter] as const))),
  };
};

/** a … z, aa, ab … */
const letterAt = (at: number): string =>
  (at < 26 ? '' : letterAt(Math.floor(at / 26) - 1)) + String.fromCharCode(97 + (at % 26));
