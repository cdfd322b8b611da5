import { estimateFromProfile, materialNamed, packPlates, usual } from '@windchest/plates';
import type { KitEstimate, PrintPlan } from '../catalogue/print/print-plans.js';

/**
 * Plates, filament and hours for one whole kit on the printer it is declared for.
 * @returns null where a material's density is not known, or a part fits on no plate
 */
export const estimateKit = ({ bed, parts }: PrintPlan): KitEstimate | null => {
  let [massG, lengthM, low, high] = [0, 0, 0, 0];
  for (const { spec, quantity, profile } of parts) {
    const material = materialNamed(spec.material);
    if (!material) return null;
    const one = estimateFromProfile(profile, spec, {
      densityGPerCm3: material.densityGPerCm3,
      diameterMm: usual.filamentMm,
    });
    massG += quantity * one.massG;
    lengthM += quantity * one.lengthM;
    low += quantity * one.minutes.low;
    high += quantity * one.minutes.high;
  }
  const { plates, tooBig } = packPlates(parts, bed, usual);
  if (tooBig.length > 0) return null;
  return { plates: plates.length, massG, lengthM, hoursLow: low / 60, hoursHigh: high / 60, bed };
};
