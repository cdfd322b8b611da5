import { noteToMidi } from '@windchest/voicing';
import { nut, saddle } from '../shapes/turnstone-bridges.js';
import { psalteryBoard, psalteryBody } from '../shapes/turnstone-body.js';
import { classroomLicence, personalLicence } from './licences.js';
import { planKit, plannedPart, workshopBuildVolume, workshopRoom } from './plan-kit.js';
import { printSpec } from './print-spec.js';
import { turnstoneStrings } from './turnstone-strings.js';
import {
  turnstoneCautions,
  turnstoneDescription,
  turnstoneFirstChanges,
  turnstoneHardware,
  turnstoneNotes,
  turnstoneTagline,
} from './turnstone-words.js';

/** A string is bought, not printed: the saddle that it stands on carries its voice. */
const saddles = turnstoneStrings.map(({ voice }, index) =>
  plannedPart(
    {
      code: `S-${noteToMidi(voice.note)}`,
      name: `Saddle ${voice.note.replace('#', '♯')}`,
      orientation: 'as-exported',
      voice,
    },
    () => saddle(index),
  ),
);

export const turnstone = planKit(
  {
    slug: 'turnstone',
    name: 'Turnstone',
    tagline: turnstoneTagline,
    description: turnstoneDescription,
    colour: 'blue',
    licences: [personalLicence(1600), classroomLicence(4800)],
  },
  [
    {
      mark: 1,
      issue: 0,
      assemblyNotes: turnstoneNotes,
      changeNotes: turnstoneFirstChanges,
      cautions: turnstoneCautions,
      printSpec: printSpec('PETG', 'Dry filament: layers that part are what fails first under strings.', {
        perimeters: 4,
        infill: 0.25,
      }),
      hardware: turnstoneHardware,
      buildVolume: workshopBuildVolume,
      declaredCents: 5,
      room: workshopRoom,
      marks: [],
      planned: [
        plannedPart({ code: 'F-01', name: 'Body', orientation: 'may-turn', fileFormat: '3mf' }, psalteryBody),
        plannedPart(
          { code: 'F-02', name: 'Board', orientation: 'may-turn', fileFormat: '3mf' },
          psalteryBoard,
        ),
        plannedPart({ code: 'N-01', name: 'Nut', orientation: 'as-exported' }, nut),
        ...saddles,
      ],
    },
  ],
);
