import type { DemoHardware } from '../demo-types.js';
import { nutHeightMm } from '../shapes/turnstone-bridges.js';
import { bodyStressMPa } from '../shapes/turnstone-body.js';
import { cautions, knifeCaution } from './cautions.js';
import { tensionRangeN, totalTensionN, wireLoad, wiresToBuy } from './turnstone-strings.js';

const total = `${Math.round(totalTensionN)} N`;
const asWeight = `${Math.round(totalTensionN / 9.81)} kg`;
const each = `${Math.round(tensionRangeN[0])} to ${Math.round(tensionRangeN[1])} N`;
const stress = bodyStressMPa(totalTensionN, nutHeightMm).toFixed(1);
const ofBreaking = `${Math.round(wireLoad * 100)} %`;

export const turnstoneTagline = 'A ten-string psaltery with a printed body and strings of steel.';

export const turnstoneDescription = `Turnstone is a small plucked psaltery: ten strings of music wire in G major, from G4 to B5, over a printed box that lies on the table or in your lap. Body, board, nut and ten saddles are printed; wire, pins and screws are not.

Each string pulls with ${each}, all ten together with ${total}, as much as ${asWeight} weigh. That is little for strings and enough for plastic. The body carries it as a box with a solid block at either end; by beam theory the stress in it stays near ${stress} N/mm², a small part of what PETG bears.

It bears it, and still gives way. Plastic under a steady load creeps: most in the first days, sooner when it is warm. So a new Turnstone goes flat over night, then over a week, then slowly; you tune it each time you play, as you would any small harp. It is a quiet instrument; a wooden table under it makes it louder.

The body is 150 × 217 mm and fits a bed of 220 × 220 mm.`;

export const turnstoneHardware: DemoHardware[] = [
  ...wiresToBuy.map(({ diameterMm, notes, metres }) => ({
    quantity: Number(metres.toFixed(1)),
    unit: 'm',
    name: `Music wire, steel, ${diameterMm.toFixed(2)} mm`,
    remark: `Strings ${notes.map((note) => note.replace('#', '♯')).join(', ')}`,
  })),
  {
    quantity: 10,
    unit: '',
    name: 'Zither pin, 5 × 40 mm, with a hole',
    remark: 'Square head; one for each string',
  },
  { quantity: 1, unit: '', name: 'Tuning wrench for the pins', remark: '' },
  {
    quantity: 0.25,
    unit: 'm',
    name: 'Brass rod, 2 mm',
    remark: '140 mm for the nut, ten times 10 mm for the saddles',
  },
  {
    quantity: 10,
    unit: '',
    name: 'M3 × 12 mm screw, pan head',
    remark: 'Hold the saddles and the strings’ loops',
  },
  { quantity: 9, unit: '', name: 'M3 × 10 mm screw, pan head', remark: 'Board and nut' },
  { quantity: 4, unit: '', name: 'Felt pad, 10 mm', remark: 'Under the body' },
];

export const turnstoneCautions = cautions({
  making: [
    knifeCaution,
    'A stretched wire that slips or breaks flies at the eyes: wear eye protection whenever you string or tune, keep your face out of the line of the strings, and bring them up in several rounds, never one at once.',
    `All strings together pull with ${total}. Look the body over before you string it and now and then afterwards: one with a crack or with layers that part is let down and printed again.`,
    'Ends of wire pierce skin. Cut them short, bend them in, and gather what you cut off.',
  ],
  playing: [
    'Wear eye protection when you tune. Do not lean over the strings.',
    'Keep it out of the sun and out of a parked car: warm plastic creeps fast. Let all strings down by a turn before you store it in the warmth.',
    'Strings cut and strangle: it is no toy for a small child to be left alone with.',
  ],
});

export const turnstoneNotes = `## 1. Print

Print the body [[F-01]] floor down, with four perimeters: they are what holds the pins. Board [[F-02]], nut [[N-01]] and the saddles come as they are. The saddles [[S-67]] to [[S-83]] differ in height by one layer, [[S-67]] the tallest: stand them in a row as you take them off the bed.

## 2. Board and nut

Screw the board [[F-02]] over the hollow with six M3 × 10 screws, the nut [[N-01]] before the row of pin holes with three, its groove towards the board. Cut 140 mm of brass rod, break its edges, and lay it in the groove.

## 3. Saddles

Screw the saddles to the slanted end, [[S-67]] at the long side, with M3 × 12 screws, not tight yet. Lay 10 mm of rod in each groove. The grooves point to the nut.

## 4. Pins

Drive a zither pin into each hole with the wrench, clockwise, until about 22 mm of it stand out. It should turn with some force and stay where you leave it. A string turns its pin with no more than 0.04 N·m. If a pin is loose, line its hole with a strip of paper.

## 5. String

Put eye protection on, and keep it on until you are done. Twist a small loop into one end of 40 cm of wire, lay it under the head of the saddle’s screw, and tighten the screw. Lead the wire over both rods to its pin, push its end through the hole, and wind it down in three turns. The wires and their notes stand in the hardware list, the pull of each string in the voicing table.

Bring all ten strings up together: first until they are straight, then a third lower than their notes, then to pitch, from the outer ones inwards. The wire is then at about ${ofBreaking} of what it bears; it is the pin and the loop that may slip.

## 6. Let it settle

Tune it again after an hour, the next morning, and every day of the first week. The body shortens by a few hundredths of a millimetre as it creeps, and each string loses some of its pull. If a string will not hold its note for a day after two weeks, look for a loop that slips before you blame the plastic.
`;

export const turnstoneFirstChanges = `### Added

- Body, board, nut and ten saddles for ten strings from G4 to B5.
`;
