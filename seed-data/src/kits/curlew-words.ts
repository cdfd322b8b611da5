import type { DemoHardware } from '../demo-types.js';
import { cautions, knifeCaution, mouthCaution } from './cautions.js';

export const curlewTagline = 'An eighteen-pipe pan flute in three blocks that lock without glue.';

export const curlewDescription = `Curlew is a chromatic pan flute from C5 to F6: eighteen stopped pipes, each printed on its own, upright, without supports. A pipe that goes wrong costs you under an hour and about ten grams, not the instrument.

Three blocks carry six pipes each. A collar on every pipe drops into a cone in its block, so all mouths end level whatever your printer does to their lengths. Bow-tie tongues draw the blocks together; push them out again and the flute goes flat into a bag.

The bores are 11 mm, drawn for 20 °C. Your lip covers a part of each mouth and pulls the pipe flat, how much is your own; three thicknesses of tuning plug lie on the floor of a pipe and bring it back, and a stroke of sanding paper does the rest. So each pipe can be set to within five cents.

Everything fits a bed of 220 × 220 mm.`;

export const curlewHardware: DemoHardware[] = [
  { quantity: 9, unit: '', name: 'M3 × 10 mm screw, pan head', remark: 'Three for each lip rail' },
  {
    quantity: 18,
    unit: '',
    name: 'Elastic ring, 14 mm inside, 2 mm thick',
    remark: 'One holds each pipe in its block; nitrile O-rings last longest',
  },
  {
    quantity: 1,
    unit: 'm',
    name: 'Cord, 3 mm',
    remark: 'Through the end tongues, if you want to hang it on you',
  },
  {
    quantity: 1,
    unit: '',
    name: 'White wood glue, a few drops',
    remark: 'Sets the tuning plugs; comes off with water',
  },
  { quantity: 1, unit: 'sheet', name: 'Wet sanding paper, 400 grit', remark: 'For the mouths of the pipes' },
];

export const curlewCautions = cautions({
  making: [
    knifeCaution,
    'The M3 screws cut their own thread: drive them slowly and stop when the head sits, or the block splits.',
  ],
  playing: [
    mouthCaution,
    'Tuning plugs are small enough to swallow: glue them in, and keep the spare ones away from children.',
    'Blowing eighteen pipes for the first time makes one light-headed: sit down to it.',
  ],
});

export const curlewGaugeNotes = `Find out first which tongues your printer needs. Print the gauge [[G-01]] and push its three lugs down into a slot of [[B-01]], one after the other. One dimple marks the clearance −, two mark 0, three mark +. Take the one that goes in under your thumb and does not rattle, and print [[J-01]] in it.

`;

/** @param gauge what stands before the tongues go in */
export const curlewNotes = (gauge: string): string => `## 1. Print

Print the eighteen pipes [[P-72]] to [[P-89]] upright, foot down, as they come. Two perimeters fill the wall. Print the blocks [[B-01]], [[B-02]] and [[B-03]] with their sockets upright. None of the parts needs supports or a brim on a clean bed.

## 2. Clean the mouths

Lay the sanding paper on a flat table and draw each pipe over it, mouth down, three or four strokes under water. Only the burr should go: a tenth of a millimetre is one cent on [[P-72]] and three on [[P-89]].

## 3. Fill the blocks

[[B-01]] has one dimple on its back, [[B-02]] two, [[B-03]] three. Drop the six longest pipes, [[P-72]] to [[P-77]], into [[B-01]] from above, the longest on your right as you play. [[P-78]] to [[P-83]] go into [[B-02]], [[P-84]] to [[P-89]] into [[B-03]]. Each collar must sit in its cone.

Roll an elastic ring up each pipe from below until it presses against the block.

## 4. Lock the row

${gauge}Stand the blocks side by side on the table. Push one [[J-01]] down between [[B-01]] and [[B-02]], the other between [[B-02]] and [[B-03]], bevelled end first. Thumb pressure is enough; if it is not, clean the slots. An M3 screw turned a little into the hole on top pulls a tongue out again.

Push the two [[J-02]] into the free slots at either end.

## 5. Screw on the lip rails

Lay one [[R-01]] on the front of each block, ridge towards the pipes, and drive its three screws until the heads just sit.

## 6. Tune

Let the flute come to the warmth of the room. Play each pipe as you will play it, with your lip where it falls. A pipe that is flat gets a plug on its floor: [[S-01]] raises [[P-72]] by about 8 cents and [[P-89]] by about 23, [[S-02]] twice and [[S-03]] three times as much. Plugs may be stacked. Take the ones that leave the pipe a little flat, and bring up the rest by drawing its mouth over the sanding paper. When the note is right, fix the plug with a drop of wood glue at its edge.

A pipe that is sharp with no plug in it was printed short: print it again, a little larger along its length.
`;

export const curlewFirstChanges = `### Added

- Eighteen pipes from C5 to F6, three blocks, locking and end tongues, lip rail and tuning plugs.
`;

export const curlewSecondChanges = `### Fixed

- Locking tongue [[J-01]] is 0.12 mm narrower on each cheek. In PETG the first one was too tight on most printers, and forcing it split a block.

### Changed

- Lip rail [[R-01]] is 1.5 mm taller, 1 mm under the mouths. On the first one the lip sank between the pipes and the top octave hissed.

### Added

- Locking tongue [[J-01]] also comes 0.1 mm tighter (−) and 0.1 mm looser (+) on each cheek. The gauge [[G-01]] tells which one your printer needs.

All other parts are the same files as in Mk 1.0.
`;
