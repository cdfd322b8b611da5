import { barLengthMm } from './bars.js';
import { noteToHz } from './notes.js';
import { pipeLengthMm } from './pipes.js';
import { airIn } from './speed-of-sound.js';
import { stringLengthMm } from './strings.js';
import { holeConductanceMm, holeDiameterMm, soundVessel, vesselConductanceMm } from './vessel.js';
import { unknownKind, type Room, type VesselVoice, type Voice } from './voice.js';
import { VoicingError } from './voicing-error.js';

/**
 * The length a voice needs to sound a note in a room, in mm: the inverse of `predict`, same formulas. The voice's
 * own `lengthMm` is not looked at.
 * @throws VoicingError `no-length` for a vessel (see `holeForMm`, `volumeForCm3`), `unreachable`, `out-of-range`,
 * `bad-note`, `bad-number`
 */
export function lengthForMm(voice: Voice, note: string, room: Room): number {
  const hz = noteToHz(note, room);
  const air = airIn(room);
  switch (voice.kind) {
    case 'stopped-pipe':
    case 'open-pipe':
      return pipeLengthMm(voice, hz, air);
    case 'free-bar':
    case 'tine':
      return barLengthMm(voice, hz);
    case 'string':
      return stringLengthMm(voice, hz);
    case 'vessel':
      throw new VoicingError(
        'no-length',
        'A vessel has no length for a note: fit its volume or the diameter of a hole instead.',
        'kind',
      );
    default:
      throw unknownKind(voice);
  }
}

/**
 * The volume a vessel needs to sound a note through its holes, in cm³. Its own `volumeCm3` is not looked at.
 * @throws VoicingError as `lengthForMm`
 */
export function volumeForCm3(voice: VesselVoice, note: string, room: Room): number {
  const air = airIn(room);
  const angular = 2 * Math.PI * noteToHz(note, room);
  const volumeCm3 = ((air.speedMS * 1000) ** 2 * vesselConductanceMm(voice)) / angular ** 2 / 1000;
  soundVessel({ ...voice, volumeCm3 }, air);
  return volumeCm3;
}

/**
 * The diameter one hole of a vessel needs for a note, in mm, the others left as they are. `holeIndex` says which
 * (the first where not given); its own diameter is not looked at.
 * @throws VoicingError `unreachable` where the other holes alone sound higher than the note, else as `lengthForMm`
 */
export function holeForMm(voice: VesselVoice, note: string, room: Room, holeIndex = 0): number {
  const air = airIn(room);
  const hz = noteToHz(note, room);
  if (voice.holes[holeIndex] === undefined) {
    throw new VoicingError('bad-number', `The vessel has no hole number ${holeIndex + 1}.`, 'holeIndex');
  }
  const wholeMm = (voice.volumeCm3 * 1000 * (2 * Math.PI * hz) ** 2) / (air.speedMS * 1000) ** 2;
  const othersMm = voice.holes.reduce(
    (sum, { diameterMm }, index) =>
      index === holeIndex ? sum : sum + holeConductanceMm(diameterMm, voice.wallMm),
    0,
  );
  if (wholeMm <= othersMm) {
    throw new VoicingError(
      'unreachable',
      `With its other holes open the vessel sounds above ${note} already: make it larger or those holes smaller.`,
      'holes',
    );
  }
  const diameterMm = holeDiameterMm(wholeMm - othersMm, voice.wallMm);
  const holes = voice.holes.map((hole, index) => (index === holeIndex ? { diameterMm } : hole));
  soundVessel({ ...voice, holes }, air);
  return diameterMm;
}
