import { isSustained, type VoiceKind } from '@windchest/voicing';
import type { Heard } from './hear-frame.js';
import { type Reading, readingOf } from './steady-pitch.js';

/** What the tuner heard of late. */
export interface Listening {
  frames: readonly { atMs: number; heard: Heard }[];
  /** What is in the air now. */
  now: 'waiting' | 'quiet' | 'noise' | 'pitch';
  /** Of the sound in the air, or the last there was. */
  reading: Reading | undefined;
}

export const notYetListening: Listening = { frames: [], now: 'waiting', reading: undefined };

/** A blown voice sounds on; a struck one is soon gone, so several strokes are taken together. */
export const patience = (kind: VoiceKind) =>
  isSustained(kind) ? { windowMs: 1500, leastFrames: 6 } : { windowMs: 6000, leastFrames: 4 };
const nowMs = 400;

/** What is heard most among the newest frames; a pitch counts where it is at least half of them. */
function inTheAir(frames: Listening['frames'], atMs: number): Listening['now'] {
  const newest = frames.filter((one) => atMs - one.atMs <= nowMs).map(({ heard }) => heard.kind);
  const count = (kind: Heard['kind']) => newest.filter((one) => one === kind).length;
  if (newest.length === 0) return 'waiting';
  if (2 * count('pitch') >= newest.length) return 'pitch';
  return count('noise') >= count('quiet') ? 'noise' : 'quiet';
}

/** Takes one more frame in. */
export function listen(before: Listening, heard: Heard, atMs: number, kind: VoiceKind): Listening {
  const { windowMs, leastFrames } = patience(kind);
  const frames = [...before.frames.filter((one) => atMs - one.atMs <= windowMs), { atMs, heard }];
  const pitches = frames.flatMap((one) => (one.heard.kind === 'pitch' ? one.heard.hz : []));
  // What was read stays readable after the sound has died away.
  const fresh = heard.kind === 'pitch' ? readingOf(pitches, leastFrames) : undefined;
  return { frames, now: inTheAir(frames, atMs), reading: fresh ?? before.reading };
}
