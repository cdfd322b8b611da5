import type { RankVoice } from '@windchest/contracts';
import { centsBetween, noteToHz, VOICE_KINDS } from '@windchest/voicing';
import { earFor, frameSizeFor } from './hear-frame.js';
import { foresee, judge, type Judging, targetOf } from './judge.js';
import { type Listening, listen, notYetListening } from './listening.js';
import { readRecording } from './read-recording.js';
import { readingOf } from './steady-pitch.js';
import { synthesizedTone, type ToneWish } from './synthesized-tone.js';

const flat = (hz: number, cents: number) => hz * 2 ** (cents / 1200);
const voices: Record<(typeof VOICE_KINDS)[number], RankVoice['voice']> = {
  'stopped-pipe': { kind: 'stopped-pipe', note: 'C5', lengthMm: 158.5, boreMm: 11, wallMm: 1.6 },
  'open-pipe': { kind: 'open-pipe', note: 'C5', lengthMm: 310, boreMm: 16, wallMm: 2 },
  'free-bar': {
    kind: 'free-bar',
    note: 'C6',
    lengthMm: 98,
    thicknessMm: 8,
    youngsModulusGPa: 2,
    densityKgM3: 1270,
  },
  tine: { kind: 'tine', note: 'A3', lengthMm: 60, thicknessMm: 2, youngsModulusGPa: 2, densityKgM3: 1270 },
  string: { kind: 'string', note: 'C2', lengthMm: 600, tensionN: 60, linearDensityGPerM: 4 },
  vessel: { kind: 'vessel', note: 'F5', volumeCm3: 40, holes: [{ diameterMm: 10 }], wallMm: 2 },
};
const judgingOf = (voice: RankVoice['voice'], rest: Partial<Judging> = {}): Judging => {
  const one = { code: 'V-01', voice };
  return { rank: [one], voice: one, room: { temperatureC: 20 }, tunedAtC: undefined, ...rest };
};
const hearTone = (wish: ToneWish, note: string): Promise<Listening> =>
  readRecording(synthesizedTone(wish), noteToHz(note), wish.kind);

describe('a pitch read from a sound', () => {
  it.each(VOICE_KINDS)('is within a cent for a %s, out of tune and in some noise', async (kind) => {
    const { note } = voices[kind];
    for (const [off, noise] of [
      [-180, 0],
      [35, 0.01],
    ] as const) {
      const hz = flat(noteToHz(note), off);
      const { reading } = await hearTone({ kind, hz, noise, seconds: 1 }, note);
      expect([off, noise, reading?.isSteady]).toEqual([off, noise, true]);
      expect(Math.abs(centsBetween(reading!.hz, hz))).toBeLessThan(1);
      expect(reading!.spreadCents).toBeLessThan(3);
    }
  });

  it('is within a cent for high voices, at the rate of compact discs', async () => {
    const hz = flat(noteToHz('E7'), 12);
    const { reading } = await hearTone(
      { kind: 'open-pipe', hz, sampleRate: 44_100, seconds: 1, noise: 0.01 },
      'E7',
    );
    expect(Math.abs(centsBetween(reading!.hz, hz))).toBeLessThan(1);
  });

  it('is found among overtones stronger than the fundamental', async () => {
    const tone = synthesizedTone({ kind: 'free-bar', hz: 1000, amplitude: 0.05 });
    const clang = synthesizedTone({ kind: 'free-bar', hz: 1000, amplitude: 0.5, only: [2] });
    const samples = tone.samples.map((one, at) => one + clang.samples[at]!);
    const { reading } = await readRecording({ ...tone, samples }, 1046.5, 'free-bar');
    expect(Math.abs(centsBetween(reading!.hz, 1000))).toBeLessThan(1);
  });

  it('is none in silence, and none in noise', async () => {
    const silence = { samples: new Float32Array(96_000), sampleRate: 48_000 };
    expect(await readRecording(silence, 523, 'stopped-pipe')).toMatchObject({
      now: 'quiet',
      reading: undefined,
    });
    const noise = await hearTone({ kind: 'vessel', hz: 700, amplitude: 0, noise: 0.2 }, 'F5');
    expect(noise).toMatchObject({ now: 'noise', reading: undefined });
  });

  it('is none in a recording shorter than one frame', async () => {
    const { now, reading } = await hearTone({ kind: 'vessel', hz: 700, seconds: 0.05 }, 'F5');
    expect([now, reading]).toEqual(['quiet', undefined]);
  });

  it('passes over what else a recording holds', async () => {
    const tone = synthesizedTone({ kind: 'stopped-pipe', hz: 520, seconds: 2 });
    const word = synthesizedTone({ kind: 'string', hz: 130, seconds: 1, noise: 0.1 });
    const samples = Float32Array.from([...word.samples, ...tone.samples]);
    const { reading } = await readRecording({ ...tone, samples }, noteToHz('C5'), 'stopped-pipe');
    expect(Math.abs(centsBetween(reading!.hz, 520))).toBeLessThan(1);
  });
});

describe('a reading of several frames', () => {
  it('is their median with the range of the middle four fifths', () => {
    const pitches = [-12, -12, -1, 0, 0, 1, 2, 3, 40, 0].map((cents) => flat(500, cents));
    const reading = readingOf(pitches, 4)!;
    expect(centsBetween(reading.hz, 500)).toBeCloseTo(0, 6);
    expect(reading.isSteady).toBe(false);
    expect(readingOf(pitches.slice(2, 8), 4)).toMatchObject({ isSteady: true });
  });

  it('leaves out another sound that came before, and waits for enough of this one', () => {
    const before = Array.from({ length: 9 }, () => 1046);
    expect(readingOf([...before, 523, 523, 523], 4)).toBeUndefined();
    expect(readingOf([...before, 523, 523, 523, 523], 4)?.hz).toBeCloseTo(523, 9);
  });
});

describe('listening', () => {
  const play = (frames: readonly ('quiet' | 'noise' | number)[], kind: RankVoice['voice']['kind']) =>
    frames.reduce<Listening>(
      (state, one, at) =>
        listen(state, typeof one === 'number' ? { kind: 'pitch', hz: one } : { kind: one }, at * 80, kind),
      notYetListening,
    );

  it('says what is in the air, and keeps the reading when the sound has died away', () => {
    expect(play(['quiet', 'quiet'], 'vessel').now).toBe('quiet');
    expect(play(['noise', 'noise', 'noise', 'quiet'], 'vessel').now).toBe('noise');
    const sounded = play([...Array<number>(8).fill(440), ...Array<'quiet'>(12).fill('quiet')], 'vessel');
    expect(sounded.now).toBe('quiet');
    expect(sounded.reading?.hz).toBeCloseTo(440, 9);
  });

  it('takes several strokes of a bar together, where a pipe has to sound on', () => {
    const strokes = [880, 880, ...Array<'quiet'>(8).fill('quiet'), 880, 880];
    expect(play(strokes, 'free-bar').reading?.hz).toBeCloseTo(880, 9);
    expect(play(strokes, 'stopped-pipe').reading).toBeUndefined();
  });
});

describe('what to make of a pitch', () => {
  const reading = (hz: number, spreadCents = 0.5) => ({ hz, spreadCents, isSteady: true });

  it.each(VOICE_KINDS)('is trim advice for a %s that is 20 cents flat', (kind) => {
    const judging = judgingOf(voices[kind]);
    const verdict = judge(reading(flat(targetOf(judging), -20)), judging);
    expect(verdict).toMatchObject({ says: 'advice', advice: { action: 'trim' } });
    expect(verdict.says === 'advice' && verdict.cents).toBeCloseTo(-20, 6);
  });

  it('leaves alone what is nearer than the reading is sure', () => {
    const judging = judgingOf(voices['stopped-pipe']);
    const hz = flat(noteToHz('C5'), -9);
    expect(judge(reading(hz), judging)).toMatchObject({ advice: { action: 'trim' } });
    expect(judge(reading(hz, 10), judging)).toMatchObject({ advice: { action: 'leave' } });
  });

  it('asks of a pipe in a cold room what it will sound where it is tuned for', () => {
    const cold = { room: { temperatureC: 10 }, tunedAtC: 20 };
    const judging = judgingOf(voices['stopped-pipe'], cold);
    // About 3 cents a degree: 600·log2(T2/T1) (ideal gas, textbook formula).
    expect(centsBetween(targetOf(judging), noteToHz('C5'))).toBeCloseTo(600 * Math.log2(283.15 / 293.15), 0);
    expect(targetOf(judgingOf(voices.tine, cold))).toBeCloseTo(220, 6);
  });

  it('knows an overtone for what it is', () => {
    const hear = (kind: (typeof VOICE_KINDS)[number], ratio: number) =>
      judge(reading(flat(noteToHz(voices[kind].note) * ratio, -30)), judgingOf(voices[kind]));
    expect(hear('stopped-pipe', 3)).toMatchObject({ says: 'partial', partial: 2, ratio: 3 });
    expect(hear('open-pipe', 2)).toMatchObject({ says: 'partial', partial: 2, ratio: 2 });
    expect(hear('free-bar', 2.757)).toMatchObject({ says: 'partial', partial: 2 });
    expect(hear('vessel', 2)).toMatchObject({ says: 'partial', ratio: 2 });
    expect(hear('string', 0.5)).toEqual({ says: 'below' });
  });

  it('hears a pipe blown over, from the sound itself, as its twelfth', async () => {
    const hz = noteToHz('C5');
    const { reading: heard } = await hearTone({ kind: 'stopped-pipe', hz, only: [2], amplitude: 0.8 }, 'C5');
    expect(judge(heard!, judgingOf(voices['stopped-pipe']))).toMatchObject({ says: 'partial', ratio: 3 });
  });

  it('names the voice that was meant, when another was chosen', () => {
    const pipe = (code: string, note: string): RankVoice => ({
      code,
      voice: { ...voices['stopped-pipe'], note } as RankVoice['voice'],
    });
    const rank = [pipe('P-72', 'C5'), pipe('P-74', 'D5'), pipe('P-86', 'D6')];
    const judging = judgingOf(rank[0]!.voice, { rank, voice: rank[0]! });
    expect(judge(reading(flat(noteToHz('D5'), 4)), judging)).toMatchObject({
      says: 'advice',
      nearer: { code: 'P-74' },
    });
    expect(judge(reading(noteToHz('D6')), judging)).toMatchObject({
      says: 'another',
      nearer: { code: 'P-86' },
    });
    expect(judge(reading(noteToHz('B6')), judging)).toEqual({
      says: 'another',
      note: 'B6',
      nearer: undefined,
    });
  });

  it('says what cannot be mended by a hole', () => {
    const vessel: RankVoice['voice'] = {
      kind: 'vessel',
      note: 'C5',
      volumeCm3: 40,
      holes: [{ diameterMm: 10 }, { diameterMm: 10 }, { diameterMm: 10 }],
      wallMm: 2,
    };
    expect(judge(reading(flat(noteToHz('C5'), 580)), judgingOf(vessel))).toMatchObject({ says: 'beyond' });
  });

  it('foresees a print with its doubts, largest first', () => {
    const foreseen = foresee(judgingOf(voices['stopped-pipe']))!;
    expect(foreseen.uncertaintyCents).toBeGreaterThan(1);
    const cents = foreseen.terms.map((term) => term.cents);
    expect(cents).toEqual([...cents].sort((a, b) => b - a));
    expect(
      foresee(judgingOf({ kind: 'stopped-pipe', note: 'C5', lengthMm: 0.0001, boreMm: 4000 })),
    ).toBeUndefined();
  });
});

describe('frames', () => {
  it('are longer for low notes', () => {
    expect(frameSizeFor(65, 48_000)).toBe(16_384);
    expect(frameSizeFor(523, 48_000)).toBe(8192);
    expect(earFor(523, 48_000)(new Float32Array(8192))).toEqual({ kind: 'quiet' });
  });
});
