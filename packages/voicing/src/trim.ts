import { openColumnMm, stoppedColumnMm } from './columns.js';
import { centsBetween, noteLabel, noteToHz } from './notes.js';
import { positive, within } from './number-checks.js';
import { airIn } from './speed-of-sound.js';
import { holeConductanceMm, holeDiameterMm, vesselConductanceMm } from './vessel.js';
import { unknownKind, type Room, type VesselVoice, type Voice } from './voice.js';
import { VoicingError } from './voicing-error.js';

export type TrimAdvice = {
  action: 'leave' | 'trim' | 'reprint-longer';
  /** How much: off the length (`trim`), onto the length (`reprint-longer`); 0 for `leave`. */
  mm: number;
  /** The pitch heard from the target; positive is sharp. */
  cents: number;
  /**
   * What `mm` counts. A vessel has no length: `trim` there means to file its widest hole wider by so much,
   * `reprint-longer` to print that hole narrower by so much.
   */
  dimension: 'length' | 'hole-diameter';
};

export type TrimOptions = {
  /** Nearer than this is left alone. 5 where not given, about what an ear can tell (common practice, no source). */
  leaveWithinCents?: number;
  /**
   * The temperature at which the voice is to sound its note. Where given, pipes and vessels heard in a colder or
   * warmer room are judged against the note moved with the speed of sound, so that a rank trimmed in a cold
   * workshop is in tune in the hall. Where not, against the note itself.
   */
  tunedAtC?: number;
};

/** No file takes off less. */
const SMALLEST_CUT_MM = 0.05;
/** Half an octave: farther off it is another voice, or the pipe jumped to a higher partial. */
const FARTHEST_CENTS = 600;

/**
 * What to do about a printed voice that was measured: leave it, trim it, or reprint it longer.
 * It works from the pitch heard, not the one computed, so that what the formulas do not know (mouth, stiffness,
 * print) drops out: a pipe's column is off by `c/4 (1/f heard − 1/f wanted)` (c/2 for an open one), a bar's length
 * goes with 1/√f, a string's with 1/f, a vessel's conductance with f². Trim less than told, and listen again.
 * @param measuredHz the fundamental heard, Hz
 * @throws VoicingError `not-this-voice` more than 600 cents off; `bad-number`, `bad-note`, `out-of-range`
 */
export function trimAdvice(
  voice: Voice,
  measuredHz: number,
  note: string,
  room: Room,
  { leaveWithinCents = 5, tunedAtC }: TrimOptions = {},
): TrimAdvice {
  within(leaveWithinCents, 0, 100, 'leaveWithinCents', 'give cents.');
  const targetHz = targetInRoomHz(voice, note, room, tunedAtC);
  const cents = centsBetween(measuredHz, targetHz);
  if (Math.abs(cents) > FARTHEST_CENTS) {
    throw new VoicingError(
      'not-this-voice',
      `${measuredHz.toFixed(1)} Hz is ${Math.abs(cents).toFixed(0)} cents from ${noteLabel(note)}: ` +
        'another voice sounded, or this one jumped to a higher partial. Sound it again, softer.',
      'measuredHz',
    );
  }
  const dimension = voice.kind === 'vessel' ? 'hole-diameter' : 'length';
  const mm = excessMm(voice, measuredHz, targetHz, room);
  if (Math.abs(cents) <= leaveWithinCents || Math.abs(mm) < SMALLEST_CUT_MM) {
    return { action: 'leave', mm: 0, cents, dimension };
  }
  return { action: cents < 0 ? 'trim' : 'reprint-longer', mm: Math.abs(mm), cents, dimension };
}

/**
 * The pitch a voice should have in a room. A pipe or vessel made for another temperature (`tunedAtC`) should there
 * sound its note moved with the speed of sound; bars, tines and strings, and all voices without `tunedAtC`, the
 * note itself.
 * @returns Hz
 * @throws VoicingError `bad-note`, `bad-number`, `out-of-range`
 */
export function targetInRoomHz(voice: Voice, note: string, room: Room, tunedAtC?: number): number {
  const noteHz = noteToHz(note, room);
  const isAirVoice = voice.kind === 'stopped-pipe' || voice.kind === 'open-pipe' || voice.kind === 'vessel';
  if (tunedAtC === undefined || !isAirVoice) return noteHz;
  return (noteHz * airIn(room).speedMS) / airIn({ ...room, temperatureC: tunedAtC }).speedMS;
}

/** How much too long a voice is (or its hole too narrow), in mm; negative when too short (too wide). */
function excessMm(voice: Voice, measuredHz: number, targetHz: number, room: Room): number {
  const { speedMS } = airIn(room);
  switch (voice.kind) {
    case 'stopped-pipe':
      return stoppedColumnMm({ hz: measuredHz, speedMS }) - stoppedColumnMm({ hz: targetHz, speedMS });
    case 'open-pipe':
      return openColumnMm({ hz: measuredHz, speedMS }) - openColumnMm({ hz: targetHz, speedMS });
    case 'free-bar':
    case 'tine':
      return positive(voice.lengthMm, 'lengthMm') * (1 - Math.sqrt(measuredHz / targetHz));
    case 'string':
      return positive(voice.lengthMm, 'lengthMm') * (1 - measuredHz / targetHz);
    case 'vessel':
      return widestHoleShortMm(voice, measuredHz, targetHz);
    default:
      throw unknownKind(voice);
  }
}

function widestHoleShortMm(voice: VesselVoice, measuredHz: number, targetHz: number): number {
  const wholeMm = vesselConductanceMm(voice);
  const widestMm = Math.max(...voice.holes.map(({ diameterMm }) => diameterMm));
  const wantedMm = holeConductanceMm(widestMm, voice.wallMm) + wholeMm * ((targetHz / measuredHz) ** 2 - 1);
  if (wantedMm <= 0) {
    throw new VoicingError(
      'unreachable',
      'The other holes alone make the vessel sound higher than its note: print it larger.',
      'holes',
    );
  }
  return holeDiameterMm(wantedMm, voice.wallMm) - widestMm;
}
