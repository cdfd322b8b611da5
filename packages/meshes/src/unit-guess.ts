import type { LengthUnit, Mesh } from './mesh.js';

/** In which unit a file was probably drawn, and what to tell its owner. */
export interface UnitGuess {
  readonly unit: LengthUnit;
  /** Whether the file states the unit or its size leaves no doubt. */
  readonly isSure: boolean;
  /** What to ask the owner; null when sure. */
  readonly sentence: string | null;
}

/** Below these longest sides, in file units, a part is smaller than anything worth printing. */
const METRE_BELOW = 1;
const INCH_BELOW = 5;
/** No desktop printer is larger; such numbers come from drawings in micrometres or from a scale slip. */
const ABSURD_ABOVE_MM = 2000;
const MICRON_ABOVE_MM = 20_000;

/**
 * Guesses the unit of a mesh from its longest side. STL states none and is read as mm. The thresholds are
 * common practice, no source: printed parts are rarely under 5 mm or over 2 m in their longest side.
 */
export function guessUnit(mesh: Mesh, sizeMm: readonly number[]): UnitGuess {
  if (mesh.format === '3mf') return { unit: mesh.statedUnit ?? 'millimeter', isSure: true, sentence: null };
  const longest = Math.max(...sizeMm);
  if (longest < METRE_BELOW) return doubt('meter', longest, 1000, 'metres');
  if (longest < INCH_BELOW) return doubt('inch', longest, 25.4, 'inches');
  if (longest > MICRON_ABOVE_MM) return doubt('micron', longest, 0.001, 'micrometres');
  if (longest > ABSURD_ABOVE_MM) {
    const sentence = `The longest side is ${trim(longest)} mm, more than printers build: check the unit and scale of the export.`;
    return { unit: 'millimeter', isSure: false, sentence };
  }
  return { unit: 'millimeter', isSure: true, sentence: null };
}

function doubt(unit: LengthUnit, longest: number, unitMm: number, plural: string): UnitGuess {
  const sentence = `The longest side is ${trim(longest)} mm. If the part was drawn in ${plural}, it is ${trim(longest * unitMm)} mm: export it in millimetres.`;
  return { unit, isSure: false, sentence };
}

function trim(lengthMm: number): string {
  return String(Number(lengthMm.toPrecision(4)));
}
