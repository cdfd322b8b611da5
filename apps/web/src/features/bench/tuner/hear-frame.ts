import { PitchDetector } from 'pitchy';
import { bandAround } from './band-pass.js';

/** What one short stretch of sound holds. */
export type Heard = { kind: 'quiet' } | { kind: 'noise' } | { kind: 'pitch'; hz: number };

/** Beneath −60 dB of full scale a microphone mostly hears itself (common practice, no source). */
const quietLevel = 0.001;
/** How much of the sound must lie around the note for it to be the voice's fundamental. */
const leastShare = 0.04;
/** 1 for a perfect tone, about 0.7 for noise of that band; both limits set by trying. */
const leastBandClarity = 0.93;
const leastClarity = 0.9;
/** As far as trim advice goes, and a hair: the advice itself refuses what lies beyond. */
export const widestCents = 610;
/** The filter swings in at the beginning; that part is not listened to. */
const settlingShare = 0.25;

const level = (samples: Float32Array): number =>
  Math.sqrt(samples.reduce((sum, one) => sum + one * one, 0) / samples.length);

/** Low notes need more time: at least some twenty periods. */
export const frameSizeFor = (targetHz: number, sampleRate: number): number =>
  targetHz / sampleRate < 120 / 48_000 ? 16_384 : 8192;

/**
 * Listens to frames for one voice. The pitch near its note is found with everything else filtered away; only where
 * there is none the whole sound is looked at, so that an octave or another voice is heard as what it is.
 * @returns a listener for frames of `frameSizeFor` samples
 */
export function earFor(targetHz: number, sampleRate: number): (frame: Float32Array) => Heard {
  const size = frameSizeFor(targetHz, sampleRate);
  const settling = size * settlingShare;
  const narrow = PitchDetector.forFloat32Array(size - settling);
  const wide = PitchDetector.forFloat32Array(size);

  return (frame) => {
    const loudness = level(frame);
    if (loudness < quietLevel) return { kind: 'quiet' };
    const band = bandAround(targetHz, frame, sampleRate).subarray(settling);
    const share = (level(band) / loudness) ** 2;
    const [bandHz, bandClarity] = narrow.findPitch(band, sampleRate);
    const isNear = bandHz > 0 && Math.abs(1200 * Math.log2(bandHz / targetHz)) < widestCents;
    if (isNear && share >= leastShare && bandClarity >= leastBandClarity)
      return { kind: 'pitch', hz: bandHz };
    const [hz, clarity] = wide.findPitch(frame, sampleRate);
    return hz > 0 && clarity >= leastClarity ? { kind: 'pitch', hz } : { kind: 'noise' };
  };
}
