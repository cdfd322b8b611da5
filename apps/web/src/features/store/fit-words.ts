import { kitTexts } from '../../config/texts/kit.js';
import { millimetres, number } from '../../lib/format.js';
import type { FitReport, PartFit } from '../bench/fit-report.js';

export interface FitLine {
  state: 'ok' | 'stop' | 'note';
  words: string;
}

/** Less than this too big is told as this: nobody prints finer. */
const leastOverMm = 0.1;

const overWords = ({ code, name, fit: { overMm } }: PartFit): string =>
  overMm
    ? kitTexts.fitOver[overMm.axis](`${code} (${name})`, millimetres(Math.max(leastOverMm, overMm.mm)))
    : '';

const turnWords = ({ code, fit: { turnedDegrees } }: PartFit): string =>
  kitTexts.fitTurnedBy(code, number(Math.abs(turnedDegrees ?? 0)));

/** What does not fit first, each part by itself; then how the rest has to lie. */
export function fitWords({ fits, unmeasured }: FitReport, volume: string): FitLine[] {
  const tooBig = fits.filter((one) => one.fit.fit === 'too-big');
  const turned = fits.filter((one) => one.fit.fit === 'fits-turned');
  const laid = fits.filter((one) => one.fit.fit === 'fits-laid');
  const fitting = fits.length - tooBig.length;
  return [
    ...(fits.length > 0
      ? [
          tooBig.length === 0
            ? { state: 'ok' as const, words: kitTexts.fitAll(fits.length, volume) }
            : { state: 'stop' as const, words: kitTexts.fitMost(fitting, fits.length, volume) },
        ]
      : []),
    ...tooBig.map((one) => ({ state: 'stop' as const, words: overWords(one) })),
    ...(turned.length > 0
      ? [{ state: 'note' as const, words: kitTexts.fitTurned(turned.map(turnWords).join(', ')) }]
      : []),
    ...(laid.length > 0
      ? [{ state: 'note' as const, words: kitTexts.fitLaid(laid.map((one) => one.code).join(', ')) }]
      : []),
    ...(unmeasured.length > 0
      ? [{ state: 'note' as const, words: kitTexts.fitUnmeasured(unmeasured.join(', ')) }]
      : []),
  ];
}
