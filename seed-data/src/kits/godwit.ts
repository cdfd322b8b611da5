import { lengthForMm, noteToMidi, PRINTED_MODULUS_GPA } from '@windchest/voicing';
import { godwitSizes, soundBoard, soundBox, tine, tineBar } from '../shapes/godwit-parts.js';
import {
  godwitCautions,
  godwitDescription,
  godwitFirstChanges,
  godwitHardware,
  godwitNotes,
  godwitTagline,
} from './godwit-words.js';
import { personalLicence } from './licences.js';
import { planKit, plannedPart, withLength, workshopBuildVolume, workshopRoom } from './plan-kit.js';
import { printSpec } from './print-spec.js';

/** PLA: the density most makers of filament state, printed solid. */
const plaKgM3 = 1240;
const solidSpec = printSpec('PLA', 'Solid, lines along the tine.', { perimeters: 3, infill: 1 });

const tines = ['C4', 'D4', 'E4', 'F4', 'G4', 'A4', 'B4', 'C5'].map((note) => {
  const unfitted = {
    kind: 'tine' as const,
    note,
    lengthMm: 1,
    thicknessMm: godwitSizes.tineThicknessMm,
    widthMm: godwitSizes.tineWidthMm,
    youngsModulusGPa: PRINTED_MODULUS_GPA.PLA.typical,
    densityKgM3: plaKgM3,
  };
  const voice = withLength(unfitted, lengthForMm(unfitted, note, workshopRoom));
  return plannedPart(
    {
      code: `T-${noteToMidi(note)}`,
      name: `Tine ${note}`,
      orientation: 'as-exported',
      printSpec: solidSpec,
      voice,
    },
    () => tine(voice.lengthMm),
  );
});

export const godwit = planKit(
  {
    slug: 'godwit',
    name: 'Godwit',
    tagline: godwitTagline,
    description: godwitDescription,
    colour: 'ochre',
    licences: [personalLicence(1400)],
  },
  [
    {
      mark: 1,
      issue: 0,
      assemblyNotes: godwitNotes,
      changeNotes: godwitFirstChanges,
      cautions: godwitCautions,
      printSpec: printSpec('PLA', 'Box and lid want an even first layer: a warped lid buzzes.'),
      hardware: godwitHardware,
      buildVolume: workshopBuildVolume,
      declaredCents: 40,
      room: workshopRoom,
      marks: [],
      planned: [
        ...tines,
        plannedPart({ code: 'G-01', name: 'Box', orientation: 'may-turn', fileFormat: '3mf' }, soundBox),
        plannedPart({ code: 'G-02', name: 'Lid', orientation: 'may-turn', fileFormat: '3mf' }, soundBoard),
        plannedPart({ code: 'G-03', name: 'Bridge', orientation: 'may-turn' }, () =>
          tineBar(godwitSizes.bridgeMm),
        ),
        plannedPart({ code: 'G-04', name: 'Clamp', orientation: 'may-turn' }, () =>
          tineBar(godwitSizes.clampMm),
        ),
      ],
    },
  ],
);
