import { VoicingError } from './voicing-error.js';

/** A tube closed at the far end, or open at both; the near end is the mouth where it is blown. */
export type PipeVoice = {
  kind: 'stopped-pipe' | 'open-pipe';
  lengthMm: number;
  boreMm: number;
  wallMm?: number;
  /**
   * The whole end correction at the mouth, in mm, in place of a plain open end's. Measure it on one pipe:
   * see `mouthCorrectionFromMm`.
   */
  mouthCorrectionMm?: number;
};

/** A bar of one thickness, free at both ends or clamped at one. Its width does not matter. */
export type BarVoice = {
  kind: 'free-bar' | 'tine';
  lengthMm: number;
  thicknessMm: number;
  youngsModulusGPa: number;
  densityKgM3: number;
};

/** A string or stretched band between two fixed ends; `lengthMm` is the part that sounds. */
export type StringVoice = {
  kind: 'string';
  lengthMm: number;
  tensionN: number;
  linearDensityGPerM: number;
};

/** A closed volume of air with round holes in its wall; `holes` are those open on this note, mouth included. */
export type VesselVoice = {
  kind: 'vessel';
  volumeCm3: number;
  holes: { diameterMm: number }[];
  wallMm: number;
};

/** What makes a part sound. */
export type Voice = PipeVoice | BarVoice | StringVoice | VesselVoice;

export type VoiceKind = Voice['kind'];

/** A voice with the note it is made for, if it has one. */
export type TargetedVoice = Voice & { note?: string };

/** The air it sounds in and the pitch it is tuned to. */
export type Room = {
  temperatureC: number;
  /** 0..1 */
  relativeHumidity?: number;
  pressurePa?: number;
  /** 440 where not given (ISO 16). */
  a4Hz?: number;
};

/** Every kind of voice, in the order of the workshop's lists. */
export const VOICE_KINDS: readonly VoiceKind[] = [
  'stopped-pipe',
  'open-pipe',
  'free-bar',
  'tine',
  'string',
  'vessel',
];

/** The refusal of a kind of voice that is none, for the end of a switch over kinds (data may come from outside). */
export function unknownKind(voice: never): VoicingError {
  const { kind } = voice as { kind: unknown };
  return new VoicingError(
    'bad-kind',
    `"${String(kind)}" is no kind of voice: ${VOICE_KINDS.join(', ')} are.`,
    'kind',
  );
}
