import { estimateFromProfile, materials, packPlates, type MaterialName } from '@windchest/plates';
import type { KitEstimate, PrintPlan } from '../catalogue/print/print-plans.js';

/** Common practice, no source: room between parts and along the edge of the bed. */
const LAYOUT = { gapMm: 5, marginMm: 5 };
/** The diameter most printers take (common practice, no source). */
const FILAMENT_MM = 1.75;

/**
 * Plates, filament and hours for one whole kit on the printer it is declared for.
 * @returns null where a material's density is not known, or a part fits on no plate
 */
export const estimateKit = ({ bed, parts }: PrintPlan): KitEstimate | null => {
  let [massG, lengthM, low, high] = [0, 0, 0, 0];
  for (const { spec, quantity, profile } of parts) {
    const material = materials[spec.material.toUpperCase() as MaterialName] as
      (typeof materials)[MaterialName] | undefined;
    if (!material) return null;
    const one = estimateFromProfile(profile, spec, {
      densityGPerCm3: material.densityGPerCm3,
      diameterMm: FILAMENT_MM,
    });
    massG += quantity * one.massG;
    lengthM += quantity * one.lengthM;
    low += quantity * one.minutes.low;
    high += quantity * one.minutes.high;
  }
  const { plates, tooBig } = packPlates(parts, bed, LAYOUT);
  if (tooBig.length > 0) return null;
  return { plates: plates.length, massG, lengthM, hoursLow: low / 60, hoursHigh: high / 60, bed };
};
