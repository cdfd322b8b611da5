import type { VoiceKind } from '@windchest/voicing';
import { earFor, frameSizeFor, widestCents } from './hear-frame.js';
import type { Listening } from './listening.js';
import { patience } from './listening.js';
import { readingOf } from './steady-pitch.js';

export interface Recording {
  samples: Float32Array;
  sampleRate: number;
}

/** A longer one is listened to at so many places, evenly spread: more say nothing new. */
const mostFrames = 160;
/** After so many frames the page gets a turn. */
const framesAtOnce = 12;

const near = (pitches: readonly number[], hz: number, cents: number): number[] =>
  pitches.filter((one) => Math.abs(1200 * Math.log2(one / hz)) < cents);

/**
 * Of all pitches of a recording the largest group that lies together, near the note before others: it may hold a
 * knock, a word or a long overtone besides the tone.
 */
function mainSound(pitches: readonly number[], targetHz: number, leastFrames: number): number[] {
  const own = near(pitches, targetHz, widestCents);
  return (own.length >= leastFrames ? own : pitches)
    .map((hz, _, all) => near(all, hz, 50))
    .reduce<number[]>((best, group) => (group.length > best.length ? group : best), []);
}

/**
 * Listens to a whole recording for one voice.
 * @param rest lets the page do something else for a moment
 */
export async function readRecording(
  { samples, sampleRate }: Recording,
  targetHz: number,
  kind: VoiceKind,
  rest: () => Promise<void> = () => Promise.resolve(),
): Promise<Listening> {
  const size = frameSizeFor(targetHz, sampleRate);
  const hear = earFor(targetHz, sampleRate);
  const hop = Math.max(size / 4, Math.floor((samples.length - size) / mostFrames));
  const frames: { atMs: number; heard: ReturnType<typeof hear> }[] = [];
  for (let start = 0; start + size <= samples.length; start += hop) {
    frames.push({ atMs: (1000 * start) / sampleRate, heard: hear(samples.subarray(start, start + size)) });
    if (frames.length % framesAtOnce === 0) await rest();
  }
  const pitches = frames.flatMap(({ heard }) => (heard.kind === 'pitch' ? heard.hz : []));
  const leastFrames = Math.min(4, patience(kind).leastFrames);
  const reading = readingOf(mainSound(pitches, targetHz, leastFrames), leastFrames);
  const isQuiet = frames.every(({ heard }) => heard.kind === 'quiet');
  return { frames, now: reading ? 'pitch' : isQuiet ? 'quiet' : 'noise', reading };
}
