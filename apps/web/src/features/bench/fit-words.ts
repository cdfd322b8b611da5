import { platesTexts as texts } from '../../config/texts/plates.js';
import { millimetres, number } from '../../lib/format.js';
import type { PartOnPrinter } from './plates-work.js';

export type NamedPart = PartOnPrinter & { name: string };

export interface FitLine {
  state: 'ok' | 'stop' | 'warn' | 'note';
  words: string;
}

/** Less than this too big is told as this: nobody prints finer. */
const leastOverMm = 0.1;
const axes = ['x', 'y', 'z'] as const;
const overLength = (mm: number) => millimetres(Math.max(leastOverMm, mm));
const degrees = (turned: number | undefined) => number(Math.abs(turned ?? 0));

/** How one part lies, in a few words. */
export function liesWords({ fit, isStood, isKeptOffByMargin }: PartOnPrinter): FitLine {
  const as = texts.liesAs;
  if (fit.overMm) return { state: 'stop', words: as.over[fit.overMm.axis](overLength(fit.overMm.mm)) };
  if (isKeptOffByMargin) return { state: 'warn', words: as.margin };
  if (fit.fit === 'fits-laid') return { state: 'ok', words: isStood ? as.stood : as.laid };
  return {
    state: 'ok',
    words: fit.fit === 'fits-turned' ? as.turned(degrees(fit.turnedDegrees)) : as.asDrawn,
  };
}

export interface FitQuestion {
  parts: readonly NamedPart[];
  unmeasured: readonly string[];
  /** `220 × 220 × 250` */
  volume: string;
  marginMm: number;
}

/** What does not fit first, each part by how much; then how the rest has to lie. */
export function fitWords({ parts, unmeasured, volume, marginMm }: FitQuestion): FitLine[] {
  const tooBig = parts.filter(({ fit }) => fit.fit === 'too-big');
  const turned = parts.filter(({ fit }) => fit.fit === 'fits-turned');
  const laid = parts.filter(({ fit, isStood }) => fit.fit === 'fits-laid' && !isStood);
  const stood = parts.filter(({ fit, isStood }) => fit.fit === 'fits-laid' && isStood);
  const keptOff = parts.filter((one) => one.isKeptOffByMargin);
  const codes = (some: readonly NamedPart[]) => some.map(({ code }) => code).join(', ');
  const line = (state: FitLine['state'], words: string, some: readonly unknown[] = parts): FitLine[] =>
    some.length > 0 ? [{ state, words }] : [];
  return [
    ...(tooBig.length === 0
      ? line('ok', texts.fitAll(parts.length, volume))
      : line('stop', texts.fitMost(parts.length - tooBig.length, parts.length, volume))),
    ...axes.flatMap((axis) => {
      const over = tooBig.filter(({ fit }) => fit.overMm?.axis === axis);
      const words = over.map(({ code, name, fit }) =>
        texts.fitOverBy(`${code} (${name})`, overLength(fit.overMm?.mm ?? 0)),
      );
      return line('stop', texts.fitOver[axis](words.join(', ')), over);
    }),
    ...line('warn', texts.fitMargin(codes(keptOff), millimetres(marginMm)), keptOff),
    ...line(
      'note',
      texts.fitTurned(
        turned.map(({ code, fit }) => texts.fitTurnedBy(code, degrees(fit.turnedDegrees))).join(', '),
      ),
      turned,
    ),
    ...line('note', texts.fitLaid(codes(laid)), laid),
    ...line('note', texts.fitStood(codes(stood)), stood),
    ...line('note', texts.fitUnmeasured(unmeasured.join(', ')), unmeasured),
  ];
}
