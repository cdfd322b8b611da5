import { requireNotNegative, requirePositive } from './plates-error.js';
import type { Material } from './types.js';

/** Cross-section of the filament in mm². Throws PlatesError for a diameter that is none. */
export function filamentAreaMm2({ diameterMm }: Pick<Material, 'diameterMm'>): number {
  requirePositive('The filament diameter in mm', diameterMm);
  return (Math.PI / 4) * diameterMm ** 2;
}

/** Mass of one metre of filament, in g: π/4·d²·ρ. */
export function gramsPerMetre(material: Material): number {
  requirePositive('The density in g/cm³', material.densityGPerCm3);
  return filamentAreaMm2(material) * material.densityGPerCm3;
}

/** Length of one kilogram of filament, in m. */
export function metresPerKilogram(material: Material): number {
  return 1000 / gramsPerMetre(material);
}

/** Mass and length of a volume of filament. */
export function filamentOf(volumeMm3: number, material: Material): { massG: number; lengthM: number } {
  requireNotNegative('The volume in mm³', volumeMm3);
  requirePositive('The density in g/cm³', material.densityGPerCm3);
  return {
    massG: (volumeMm3 / 1000) * material.densityGPerCm3,
    lengthM: volumeMm3 / filamentAreaMm2(material) / 1000,
  };
}

/**
 * What a mass of filament costs, in the currency of the price, unrounded: mass/1000 × price per kg.
 *
 * @returns `null` where the material has no price.
 */
export function filamentCost(massG: number, { pricePerKg }: Pick<Material, 'pricePerKg'>): number | null {
  requireNotNegative('The mass in g', massG);
  if (pricePerKg === undefined) return null;
  requireNotNegative('The price per kg', pricePerKg);
  return (massG / 1000) * pricePerKg;
}

/** Whole spools to buy for a mass, when each holds `spoolG` grams of filament (1 kg if not given). */
export function spoolsFor(massG: number, spoolG = 1000): number {
  requireNotNegative('The mass in g', massG);
  requirePositive('The filament on a spool in g', spoolG);
  return Math.max(0, Math.ceil(massG / spoolG - 1e-9));
}
