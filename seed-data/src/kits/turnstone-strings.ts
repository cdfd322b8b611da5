import { noteToHz, stringTensionN } from '@windchest/voicing';
import type { DemoVoice } from '../demo-types.js';
import { stringMm } from '../shapes/turnstone-sizes.js';

/** Carbon steel; the figure most tables give. */
const steelKgM3 = 7850;
/** What music wire of these diameters bears before it breaks, at least (from memory of makers’ tables). */
const wireBreaksMPa = 2200;

const wires: readonly { diameterMm: number; notes: readonly string[] }[] = [
  { diameterMm: 0.35, notes: ['G4', 'A4'] },
  { diameterMm: 0.3, notes: ['B4', 'C5', 'D5', 'E5'] },
  { diameterMm: 0.25, notes: ['F#5', 'G5', 'A5', 'B5'] },
];

type StringVoice = Extract<DemoVoice, { kind: 'string' }>;

interface TurnstoneString {
  readonly diameterMm: number;
  readonly voice: StringVoice;
}

/** A round wire’s mass, `ρ π d² / 4`: in g per m from kg/m³ and mm. */
const wireGPerM = (diameterMm: number) => (steelKgM3 * Math.PI * diameterMm ** 2) / 4 / 1000;

/** The strings, lowest first: lengths and wires are drawn, tensions follow from the notes. */
export const turnstoneStrings: readonly TurnstoneString[] = wires
  .flatMap(({ diameterMm, notes }) => notes.map((note) => ({ diameterMm, note })))
  .map(({ diameterMm, note }, index) => {
    const measures = {
      lengthMm: stringMm(index),
      linearDensityGPerM: Number(wireGPerM(diameterMm).toFixed(4)),
    };
    const tensionN = Number(stringTensionN({ ...measures, hz: noteToHz(note) }).toFixed(2));
    return { diameterMm, voice: { kind: 'string', note, ...measures, tensionN } };
  });

const tensions = turnstoneStrings.map(({ voice }) => voice.tensionN);
export const totalTensionN = tensions.reduce((sum, tensionN) => sum + tensionN, 0);
export const tensionRangeN = [Math.min(...tensions), Math.max(...tensions)] as const;

/** The hardest-drawn string’s part of what its wire bears. */
export const wireLoad = Math.max(
  ...turnstoneStrings.map(
    ({ diameterMm, voice }) => voice.tensionN / ((Math.PI * diameterMm ** 2) / 4) / wireBreaksMPa,
  ),
);

/** What to buy of each wire: its strings with room for loops and windings. */
export const wiresToBuy = wires.map(({ diameterMm, notes }) => ({
  diameterMm,
  notes,
  metres: notes.length * 0.4,
}));
