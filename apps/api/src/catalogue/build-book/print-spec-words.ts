import type { PrintSpecification } from '@windchest/contracts';
import type { BookPart } from './build-book.js';
import { numberText } from './number-text.js';

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

/** What a part's own specification has different from the book's: `Perimeters 3, infill 100 %`. */
export const specDifference = (own: PrintSpecification | null, common: PrintSpecification): string => {
  if (!own) return '';
  const usual = new Map(specRows(common));
  const words = specRows(own)
    .filter(([name, value]) => usual.get(name) !== value)
    .map(([name, value]) => `${name.toLowerCase()} ${name === 'Supports' ? value.toLowerCase() : value}`);
  const remarks = own.remarks.trim();
  if (remarks !== '' && remarks !== common.remarks.trim()) words.push(remarks);
  const text = words.join(', ');
  return text.charAt(0).toUpperCase() + text.slice(1);
};
