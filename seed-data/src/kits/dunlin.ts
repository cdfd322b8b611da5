import { noteToMidi, volumeForCm3 } from '@windchest/voicing';
import { mouthpiece, strap } from '../shapes/dunlin-fittings.js';
import { chamberAreaMm2, dunlinSizes, dunlinVessel, windowDiameterMm } from '../shapes/dunlin-vessel.js';
import {
  dunlinCautions,
  dunlinDescription,
  dunlinFirstChanges,
  dunlinHardware,
  dunlinNotes,
  dunlinTagline,
} from './dunlin-words.js';
import { personalLicence } from './licences.js';
import { planKit, plannedPart, toHundredthMm, workshopBuildVolume, workshopRoom } from './plan-kit.js';
import { printSpec } from './print-spec.js';

const voices = ['F5', 'A5', 'C6'].map((note) => {
  const unfitted = {
    kind: 'vessel' as const,
    note,
    volumeCm3: 1,
    holes: [{ diameterMm: toHundredthMm(windowDiameterMm) }],
    wallMm: dunlinSizes.frontWallMm,
  };
  const heightMm = toHundredthMm((volumeForCm3(unfitted, note, workshopRoom) * 1000) / chamberAreaMm2);
  // Rounded again, or the last bits of the division would show as 23.212799999999998.
  return { ...unfitted, volumeCm3: Number(((heightMm * chamberAreaMm2) / 1000).toFixed(4)) };
});

const vessels = voices.map((voice) =>
  plannedPart(
    {
      code: `V-${noteToMidi(voice.note)}`,
      name: `Vessel ${voice.note}`,
      orientation: 'as-exported',
      voice,
    },
    () => dunlinVessel(voice.volumeCm3),
  ),
);

export const dunlin = planKit(
  {
    slug: 'dunlin',
    name: 'Dunlin',
    tagline: dunlinTagline,
    description: dunlinDescription,
    colour: 'violet',
    licences: [personalLicence(0)],
  },
  [
    {
      mark: 1,
      issue: 0,
      assemblyNotes: dunlinNotes,
      changeNotes: dunlinFirstChanges,
      cautions: dunlinCautions,
      printSpec: printSpec('PLA', 'Full fan from the third layer: the window is bridged.', { perimeters: 3 }),
      hardware: dunlinHardware,
      buildVolume: workshopBuildVolume,
      declaredCents: 30,
      room: workshopRoom,
      marks: [],
      planned: [
        ...vessels,
        plannedPart(
          { code: 'N-01', name: 'Mouthpiece', orientation: 'as-exported', fileFormat: '3mf' },
          mouthpiece,
        ),
        plannedPart({ code: 'C-01', name: 'Strap', orientation: 'may-turn' }, strap),
      ],
    },
  ],
);
