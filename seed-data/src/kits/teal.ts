import { lengthForMm, noteToMidi, PRINTED_MODULUS_GPA } from '@windchest/voicing';
import { beaterHandle, beaterHead, chimeBar, tealSizes } from '../shapes/teal-bars.js';
import { barRail, crossPiece } from '../shapes/teal-frame.js';
import { personalLicence, smallRunLicence } from './licences.js';
import { planKit, plannedPart, withLength, workshopBuildVolume, workshopRoom } from './plan-kit.js';
import { printSpec } from './print-spec.js';
import {
  tealCautions,
  tealDescription,
  tealFirstChanges,
  tealHardware,
  tealNotes,
  tealTagline,
} from './teal-words.js';

/** PETG: the density most makers of filament state, printed solid. */
const petgKgM3 = 1270;
const spec = printSpec('PETG', 'Bars: one spool for all eight.');
const solidSpec = printSpec('PETG', 'Solid, lines along the bar: air inside would lower the note.', {
  perimeters: 3,
  infill: 1,
});

const voices = ['C5', 'D5', 'E5', 'F5', 'G5', 'A5', 'B5', 'C6'].map((note) => {
  const unfitted = {
    kind: 'free-bar' as const,
    note,
    lengthMm: 1,
    thicknessMm: tealSizes.barThicknessMm,
    widthMm: tealSizes.barWidthMm,
    youngsModulusGPa: PRINTED_MODULUS_GPA.PETG.typical,
    densityKgM3: petgKgM3,
  };
  return withLength(unfitted, lengthForMm(unfitted, note, workshopRoom));
});
const lengths = voices.map((voice) => voice.lengthMm);

const bars = voices.map((voice) =>
  plannedPart(
    {
      code: `B-${noteToMidi(voice.note)}`,
      name: `Bar ${voice.note}`,
      orientation: 'as-exported',
      printSpec: solidSpec,
      voice,
    },
    () => chimeBar(voice.lengthMm),
  ),
);

export const teal = planKit(
  {
    slug: 'teal',
    name: 'Teal',
    tagline: tealTagline,
    description: tealDescription,
    colour: 'teal',
    licences: [personalLicence(900), smallRunLicence(3600, 50)],
  },
  [
    {
      mark: 1,
      issue: 0,
      assemblyNotes: tealNotes,
      changeNotes: tealFirstChanges,
      cautions: tealCautions,
      printSpec: spec,
      hardware: tealHardware,
      buildVolume: workshopBuildVolume,
      declaredCents: 25,
      room: workshopRoom,
      marks: [],
      planned: [
        ...bars,
        plannedPart({ code: 'F-01', name: 'Rail, front', orientation: 'may-turn', fileFormat: '3mf' }, () =>
          barRail(lengths, 'front'),
        ),
        plannedPart({ code: 'F-02', name: 'Rail, back', orientation: 'may-turn', fileFormat: '3mf' }, () =>
          barRail(lengths, 'back'),
        ),
        plannedPart({ code: 'F-03', name: 'Cross piece, long', orientation: 'may-turn' }, () =>
          crossPiece(lengths[0] ?? 0),
        ),
        plannedPart({ code: 'F-04', name: 'Cross piece, short', orientation: 'may-turn' }, () =>
          crossPiece(lengths.at(-1) ?? 0),
        ),
        plannedPart({ code: 'K-01', name: 'Beater head', quantity: 2, orientation: 'may-turn' }, beaterHead),
        plannedPart(
          { code: 'K-02', name: 'Beater handle', quantity: 2, orientation: 'may-turn' },
          beaterHandle,
        ),
      ],
    },
  ],
);
