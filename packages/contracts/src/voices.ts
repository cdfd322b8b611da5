import { z } from 'zod';

const mm = z.number().positive().max(5000);
export const noteName = z.string().regex(/^[A-G](#|b|♯|♭)?-?[0-9]$/, 'Write a note as C5, F#4 or Bb3.');

/** What makes a part sound, with the note it is meant to give. */
export const voice = z.discriminatedUnion('kind', [
  z.object({
    kind: z.enum(['stopped-pipe', 'open-pipe']),
    note: noteName,
    lengthMm: mm,
    boreMm: mm,
    wallMm: mm.optional(),
    mouthCorrectionMm: z.number().min(0).max(200).optional(),
  }),
  z.object({
    kind: z.enum(['free-bar', 'tine']),
    note: noteName,
    lengthMm: mm,
    thicknessMm: mm,
    widthMm: mm.optional(),
    youngsModulusGPa: z.number().positive().max(500),
    densityKgM3: z.number().positive().max(25_000),
  }),
  z.object({
    kind: z.literal('string'),
    note: noteName,
    lengthMm: mm,
    tensionN: z.number().positive().max(5000),
    linearDensityGPerM: z.number().positive().max(500),
  }),
  z.object({
    kind: z.literal('vessel'),
    note: noteName,
    volumeCm3: z.number().positive().max(100_000),
    holes: z
      .array(z.object({ diameterMm: mm }))
      .min(1)
      .max(20),
    wallMm: mm,
  }),
]);
export type VoiceWithNote = z.output<typeof voice>;

/** One voice as it is drawn and sounded: `widthMm` is the outer width of a pipe, a bar's width, a vessel's diameter. */
export const rankVoice = z.object({ code: z.string(), voice });
export type RankVoice = z.output<typeof rankVoice>;

export const room = z.object({
  temperatureC: z.number().min(-10).max(50),
  relativeHumidity: z.number().min(0).max(1).optional(),
  a4Hz: z.number().min(380).max(500).optional(),
});
