import { isSustained, partialsOf, type VoiceKind } from '@windchest/voicing';
import type { Recording } from './read-recording.js';

export interface ToneWish {
  kind: VoiceKind;
  hz: number;
  seconds?: number;
  sampleRate?: number;
  /** Of the strongest partial, of full scale. */
  amplitude?: number;
  /** White noise, of full scale. */
  noise?: number;
  /** Seconds in which a struck voice falls to a third. */
  ringS?: number;
  /** Partials to sound, counted from 1; all where not given. */
  only?: readonly number[];
}

/** Numbers from 0 to 1 that look like chance and are the same each time (a linear congruential generator). */
function chance(seed: number): () => number {
  let state = seed;
  return () => (state = (state * 1_664_525 + 1_013_904_223) % 2 ** 32) / 2 ** 32;
}

/** What a voice sounds like to a microphone, for tests: its partials, dying away where it is struck, and noise. */
export function synthesizedTone(wish: ToneWish): Recording {
  const { kind, hz, seconds = 1, sampleRate = 48_000, amplitude = 0.2, noise = 0, ringS = 0.4, only } = wish;
  const random = chance(Math.round(hz * 1000));
  const partials = partialsOf(kind).filter((_, index) => !only || only.includes(index + 1));
  const phases = partials.map(() => 2 * Math.PI * random());
  const samples = Float32Array.from({ length: Math.round(seconds * sampleRate) }, (_, at) => {
    const time = at / sampleRate;
    const sound = partials.reduce((sum, { ratio, amplitude: strength }, index) => {
      const dying = isSustained(kind) ? 1 : Math.exp((-time * Math.sqrt(ratio)) / ringS);
      return sum + strength * dying * Math.sin(2 * Math.PI * ratio * hz * time + phases[index]!);
    }, 0);
    return amplitude * sound + noise * (2 * random() - 1);
  });
  return { samples, sampleRate };
}
