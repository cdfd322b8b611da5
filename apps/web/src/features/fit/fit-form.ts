import type { InputOf } from '@windchest/contracts';

export type FitWords = InputOf<'POST /shelf/:slug/fit-reports'>['body'];
export const fitWordNames = [
  'partCode',
  'clearance',
  'printerName',
  'material',
  'nozzleMm',
  'layerMm',
  'verdict',
  'gapMm',
  'words',
] as const;

/** An empty field is no measurement. */
export const gapOf = (typed: string): number | null =>
  typed.trim() === '' ? null : Number(typed.replace('−', '-').replace(',', '.'));
