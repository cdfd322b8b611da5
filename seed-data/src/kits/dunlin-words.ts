import type { DemoHardware } from '../demo-types.js';
import { cautions, knifeCaution, mouthCaution } from './cautions.js';

export const dunlinTagline = 'Three vessel whistles blown as one: a chord in the pocket.';

export const dunlinDescription = `Dunlin is three small vessels side by side, F5, A5 and C6, with one mouthpiece across them: one breath, one chord. It has no finger holes and nothing that moves.

A vessel whistle is a closed room of air with a window in its wall. Its note is set by how much air it holds and how large the window is, hardly at all by its shape; so these are flat and narrow, print without supports, and have a lip that your slicer can draw sharply.

It is free, as a first print from this workshop: if Dunlin comes off your bed and sounds, so will the larger kits.`;

export const dunlinHardware: DemoHardware[] = [
  { quantity: 1, unit: '', name: 'Beeswax, a pea', remark: 'Seals the beaks in the mouthpiece' },
  { quantity: 1, unit: '', name: 'Needle file, flat', remark: 'Opens the windows while tuning' },
];

export const dunlinCautions = cautions({
  making: [
    knifeCaution,
    'Hold a vessel in a vice with soft jaws while you file its window, not in your hand.',
  ],
  playing: [
    mouthCaution,
    'A whistle at the ear can harm hearing: do not blow it close to anyone, and not long in a small room.',
  ],
});

export const dunlinNotes = `## 1. Print

Print the vessels [[V-77]], [[V-81]] and [[V-84]] as they come, roof down and beak up. The window needs a cool, clean bridge: full fan. Look through the windway from the beak; a string across it silences the vessel. Pull it out with a needle.

## 2. Try each one

Blow into the beak of one vessel at a time, softly. It should speak at once. If it hisses, the lip is rough: draw the file once along its slope.

## 3. Tune

Blow as gently as you will later. To raise a vessel, open its window a little upwards, away from the beak: a tenth of a millimetre at a time. To lower it, lay a strip of tape over a part of the window. A vessel follows your breath by a quarter tone, so tune all three with the same one, within 30 cents of each other.

## 4. Put together

Push the strap [[C-01]] over the three vessels, windows on one side, the tall one at the left. Run a thread of beeswax round the beaks and press them into the mouthpiece [[N-01]], its lips towards the windows.
`;

export const dunlinFirstChanges = `### Added

- Three vessels, F5, A5 and C6, a mouthpiece and a strap.
`;
