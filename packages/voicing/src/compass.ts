import { midiToNote, noteLabel, noteToMidi } from './notes.js';
import { predict } from './predict.js';
import type { Room, TargetedVoice } from './voice.js';

/**
 * The compass of a rank, lowest to highest note, as people read it: `C5–F6`; one note alone for one note, an empty
 * text for no voices. A voice without a note of its own counts with the nearest one it sounds in the room (20 °C
 * where not given).
 * @throws VoicingError as `predict`, `bad-note`
 */
export function compassOf(voices: readonly TargetedVoice[], room: Room = { temperatureC: 20 }): string {
  const numbers = voices.map((voice) => noteToMidi(voice.note ?? predict(voice, room).note));
  if (numbers.length === 0) return '';
  const lowest = noteLabel(midiToNote(Math.min(...numbers)));
  const highest = noteLabel(midiToNote(Math.max(...numbers)));
  return lowest === highest ? lowest : `${lowest}–${highest}`;
}
