import type { RankVoice, VoiceWithNote } from '@windchest/contracts';
import { compassOf, noteToMidi } from '@windchest/voicing';
import type { Room } from '../revisions/revision.model.js';

/** All voices of a kit in order, lowest first. */
export const rankOf = (parts: readonly { code: string; voice: VoiceWithNote | null }[]): RankVoice[] =>
  parts
    .flatMap(({ code, voice }) => (voice ? [{ code, voice }] : []))
    .sort((a, b) => noteToMidi(a.voice.note) - noteToMidi(b.voice.note) || a.code.localeCompare(b.code));

export const compassOfRank = (rank: readonly RankVoice[], room: Room): string =>
  compassOf(
    rank.map(({ voice }) => voice as Parameters<typeof compassOf>[0][number]),
    voicingRoom(room),
  );

/** The voicing package wants what is not known left out rather than undefined. */
export const voicingRoom = (
  room: Room,
): { temperatureC: number; relativeHumidity?: number; a4Hz?: number } => ({
  temperatureC: room.temperatureC,
  ...(room.relativeHumidity === undefined ? {} : { relativeHumidity: room.relativeHumidity }),
  ...(room.a4Hz === undefined ? {} : { a4Hz: room.a4Hz }),
});
