import type { DemoHardware } from '../demo-types.js';
import { cautions, knifeCaution } from './cautions.js';

export const godwitTagline = 'A box with eight printed tines, tuned by sliding them.';

export const godwitDescription = `Godwit is a thumb box: eight flat tines over a hollow body, C4 to C5. Each tine is a piece of PLA clamped at one end and plucked at the other; the box makes it loud enough for a room.

Printed tines are softer than steel ones, and no two spools agree, so Godwit does not pretend to come out in tune. Each tine has a slot in its tail. Loosen one screw, slide the tine, tighten: three millimetres either way move it by more than a whole tone. A tine that tires can be printed again in ten minutes.

The longest part is the box, 120 mm; the whole kit prints on two small plates.`;

export const godwitHardware: DemoHardware[] = [
  { quantity: 8, unit: '', name: 'M3 × 25 mm screw, pan head', remark: 'One through each tine' },
  { quantity: 8, unit: '', name: 'M3 nut with washer', remark: 'Inside the box' },
  { quantity: 4, unit: '', name: 'M3 × 10 mm screw, pan head', remark: 'Lid' },
  { quantity: 4, unit: '', name: 'Felt pad, 10 mm', remark: 'Under the box' },
];

export const godwitCautions = cautions({
  making: [
    knifeCaution,
    'Break the edges of the tines’ tips with sanding paper: a sharp one cuts a thumb in a minute.',
    'A tine that is bent too far can snap and fly: wear glasses while you set the clamp.',
  ],
  playing: [
    'Stop when your thumbs are sore.',
    'Do not leave the box in a hot car: PLA creeps under the clamp from about 50 °C and every tine goes flat.',
  ],
});

export const godwitNotes = `## 1. Print

Print the tines [[T-60]] to [[T-72]] solid and flat. Box [[G-01]] and lid [[G-02]] print as they come, the box open side up.

## 2. Stack

Push the eight M3 × 25 screws from above through the clamp [[G-04]], through the slots of the tines, through the bridge [[G-03]] and the lid [[G-02]], and put a washer and a nut on each from below, finger-tight. The long tines go in the middle: [[T-60]], [[T-62]], [[T-64]] and [[T-65]] on the inner four places, the higher ones outwards on either side. All tips point towards the round hole.

## 3. Square the clamp

Push clamp and bridge until their edges lie exactly over each other: the tines must be held along one straight edge. Tighten the nuts a little more.

## 4. Tune

Pluck a tine and slide it: further out is lower. One millimetre is about 75 cents on [[T-60]] and about 110 on [[T-72]]. Tighten its nut fully and listen again, for the clamp takes up to a quarter tone with it. Within 40 cents the scale sounds like itself; take your time and it will be better.

## 5. Close

Screw the lid on the box with four M3 × 10 screws and stick the felt pads under it.
`;

export const godwitFirstChanges = `### Added

- Eight tines from C4 to C5, box, lid, bridge and clamp.
`;
