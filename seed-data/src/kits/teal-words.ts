import type { DemoHardware } from '../demo-types.js';
import { cautions, knifeCaution } from './cautions.js';

export const tealTagline = 'Eight chime bars on felt, with two beaters. Prints in an afternoon.';

export const tealDescription = `Teal is a small set of chime bars, one octave of C major from C5 to C6. The bars are plain flat pieces of PETG, printed solid, lying on felt at the two places where a free bar stands still; a loose screw through each of those places keeps it from walking off.

The tone is dry and short, between wood and stone: loud enough for a kitchen table, quiet enough for a bedroom wall. Nothing in it can go out of tune by itself, for a bar does not care how warm the room is.

Plastics differ in stiffness from spool to spool, so a new set comes off the bed as a scale that is a little high or low as a whole. A file brings each bar to within a quarter of a semitone in a few minutes; the notes say where to take off and how much.`;

export const tealHardware: DemoHardware[] = [
  { quantity: 16, unit: '', name: 'M3 × 16 mm screw, pan head', remark: 'Two pins for each bar' },
  { quantity: 4, unit: '', name: 'M3 × 8 mm screw, pan head', remark: 'Cross pieces' },
  { quantity: 2, unit: '', name: 'Wool felt, 12 × 210 mm, 2 mm thick', remark: 'One strip for each rail' },
  { quantity: 1, unit: '', name: 'Superglue gel, a few drops', remark: 'Beater heads' },
  { quantity: 1, unit: '', name: 'Flat file, medium', remark: 'For tuning' },
];

export const tealCautions = cautions({
  making: [
    knifeCaution,
    'Clamp a bar while you file it. Superglue sticks skin at once: follow its data sheet, wear glasses, air the room.',
  ],
  playing: [
    'The bars want a tap, not a blow: a beater that slips can hit an eye.',
    'Check the beater heads now and then; glue one again before it flies off.',
  ],
});

export const tealNotes = `## 1. Print

Print the eight bars [[B-72]] to [[B-84]] solid and flat, the frame and the handles at the usual infill. Keep all bars on one spool: they must share one stiffness.

## 2. Frame

Lay the rails [[F-01]] and [[F-02]] parallel, holes up, wide ends together. Screw the long cross piece [[F-03]] under their wide ends and the short one [[F-04]] under the narrow ends with M3 × 8 screws; the heads sink into the underside.

Lay a strip of felt along each rail and prick it through at every hole.

## 3. Beaters

Put a drop of glue into each head [[K-01]] and push a handle [[K-02]] in to the bottom.

## 4. Tune before you pin

Lay a bar loose on the felt and tap it in the middle. With a spool you have not used before the whole set may be off by up to a whole tone, all bars by about the same amount. If it is more than a semitone, scale the bars along their length in your slicer and print them again: one per cent shorter is 35 cents higher.

- Too low: file the ends, both alike. On [[B-72]] half a millimetre off each end is about 35 cents, on [[B-84]] about 50.
- Too high: file a shallow hollow across the underside, in the middle third. A tenth of a millimetre is about 30 cents: go slowly.

The short bars come out lower than the long ones, by up to 18 cents: that is their thickness, which the simple formula leaves out.

## 5. Pin the bars

Longest bar at the wide end. Drive an M3 × 16 screw through each hole into the rail, and stop while a sheet of paper still goes under its head. A bar that is held cannot sing.
`;

export const tealFirstChanges = `### Added

- Eight bars from C5 to C6, two rails, two cross pieces, and a pair of beaters.
`;
