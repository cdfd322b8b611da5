import { tunerTexts as texts, kindWords } from '../../../config/texts/tuner.js';
import { cents as signedCents, number } from '../../../lib/format.js';
import { noteName } from '../drawn-voices.js';
import type { Judging, NearVoice, Verdict } from './judge.js';
import type { Reading } from './steady-pitch.js';

export interface VerdictWords {
  /** How far off: "20 cents flat". */
  headline: string;
  /** "Trim 1.9 mm off the open end." */
  todo: string;
  notes: string[];
  /** Another voice that may be meant. */
  other: NearVoice | undefined;
}

/** `12 cents flat`, `In tune` under half a cent. */
export function offWords(cents: number): string {
  const rounded = Math.round(Math.abs(cents));
  if (rounded === 0) return texts.inTune;
  const words = texts.cents(number(rounded));
  return cents < 0 ? texts.flat(words) : texts.sharp(words);
}

/** Lengths as they can be cut: tenths of a millimetre. */
const tenths = (mm: number): string => (mm < 0.095 ? texts.hair : `${number(mm, 1)} mm`);

/** A string's pitch goes with the root of its tension (Mersenne), so its tension with the square of the pitch. */
const tensionPercent = (cents: number): string =>
  texts.percent(number(Math.abs(2 ** (-cents / 600) - 1) * 100, 1));

const overtoneName = (ratio: number, partial: number): string => {
  if (ratio === 2) return texts.octave;
  if (ratio === 3) return texts.twelfth;
  return ratio === 4 ? texts.doubleOctave : (texts.overtones[partial - 2] ?? texts.someOvertone);
};

type Advised = Extract<Verdict, { says: 'advice' }>;

function adviceWords(
  { advice, cents, nearer }: Advised,
  reading: Reading,
  judging: Judging,
  declaredCents: number,
) {
  const { kind } = judging.voice.voice;
  const isWithin = Math.abs(cents) <= declaredCents;
  const notes = [
    ...(isWithin && Math.abs(cents) >= 0.5 ? [texts.withinDeclared(texts.cents(number(declaredCents)))] : []),
    ...(nearer ? [texts.nearer(noteName(nearer.note), nearer.code, signedCents(nearer.cents))] : []),
  ];
  if (advice.action === 'leave')
    return { todo: Math.abs(cents) > 5 ? texts.leaveUnsteady : texts.leave, notes };
  if (!reading.isSteady) return { todo: texts.unsteady, notes };
  const say = advice.action === 'trim' ? kindWords[kind].trim : kindWords[kind].lengthen;
  const isCut = advice.action === 'trim' && kind !== 'string';
  return {
    todo: say(tenths(advice.mm), tensionPercent(cents)),
    notes: [...(isCut ? [texts.listenAgain] : []), ...notes],
  };
}

/** A verdict as it is read. */
export function verdictWords(
  verdict: Verdict,
  reading: Reading,
  judging: Judging,
  declaredCents: number,
): VerdictWords {
  const { kind, note } = judging.voice.voice;
  const own = noteName(note);
  const other = 'nearer' in verdict ? verdict.nearer : undefined;
  const maybe = other ? [texts.orVoice(noteName(other.note), other.code)] : [];
  switch (verdict.says) {
    case 'advice':
      return {
        headline: offWords(verdict.cents),
        ...adviceWords(verdict, reading, judging, declaredCents),
        other,
      };
    case 'beyond':
      return { headline: offWords(verdict.cents), todo: texts.beyond, notes: [verdict.sentence], other };
    case 'partial':
      return {
        headline: texts.overtone(overtoneName(verdict.ratio, verdict.partial), own),
        todo: kindWords[kind].overtone,
        notes: maybe,
        other,
      };
    case 'below':
      return { headline: texts.below(own), todo: texts.belowDetail, notes: [], other };
    case 'another':
      return {
        headline: verdict.note ? texts.another(noteName(verdict.note), own) : texts.tooFar(own),
        todo: texts.anotherDetail,
        notes: maybe,
        other,
      };
  }
}
