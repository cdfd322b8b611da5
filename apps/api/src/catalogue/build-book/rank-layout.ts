import type { BookVoice } from './build-book.js';

export interface PlacedVoice {
  readonly voice: BookVoice;
  readonly xMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly slotMm: number;
}
export interface RankLayout {
  readonly voices: readonly PlacedVoice[];
  readonly widthMm: number;
  readonly heightMm: number;
}

/** A string is a line: two of them need room between them all the same. */
const leastSlotMm = (kind: BookVoice['kind']): number => (kind === 'string' ? 10 : 6);
const leastGapMm = 1.2;

/** Voices side by side at life size, a gap of a little more than a quarter of their mean width between them. */
export const layOutRank = (voices: readonly BookVoice[]): RankLayout => {
  const meanMm = voices.reduce((sum, { widthMm }) => sum + widthMm, 0) / Math.max(1, voices.length);
  const gapMm = Math.max(leastGapMm, meanMm * 0.28);
  let nextMm = 0;
  const placed = voices.map((voice): PlacedVoice => {
    const slotMm = Math.max(leastSlotMm(voice.kind), voice.widthMm + gapMm);
    const xMm = nextMm + (slotMm - voice.widthMm) / 2;
    nextMm += slotMm;
    return { voice, xMm, slotMm, widthMm: voice.widthMm, heightMm: voice.lengthMm ?? voice.widthMm };
  });
  return { voices: placed, widthMm: nextMm, heightMm: Math.max(0, ...placed.map((one) => one.heightMm)) };
};
