import { predict, VoicingError } from '@windchest/voicing';
import { voicingRoom } from '../kits/rank.js';
import { counted, listed, notNeeded, open, passed, type GateCheck } from './gate-facts.js';

/** Every voice sounds its note within the declared cents, in the room the revision is voiced for. */
export const voicesInTune: GateCheck = ({ parts, revision }) => {
  const name = 'voices-in-tune';
  const voiced = parts.flatMap((part) => (part.voice ? [{ code: part.code, voice: part.voice }] : []));
  if (voiced.length === 0) return notNeeded(name, 'No part of this kit has a voice.');
  const room = voicingRoom(revision.room);
  const faults = voiced.flatMap(({ code, voice }) => {
    try {
      const { cents } = predict(voice as Parameters<typeof predict>[0], room);
      if (Math.abs(cents) <= revision.declaredCents) return [];
      return [
        `${code} is ${Math.abs(cents).toFixed(0)} cents ${cents > 0 ? 'above' : 'below'} ${voice.note}`,
      ];
    } catch (fault) {
      if (fault instanceof VoicingError) return [`${code}: ${fault.message}`];
      throw fault;
    }
  });
  const within = `±${revision.declaredCents} cents at ${revision.room.temperatureC} °C`;
  return faults.length > 0
    ? open(name, `Not within ${within}: ${listed(faults)}.`)
    : passed(name, `${counted(voiced.length, 'voice')} predicted within ${within}.`);
};
