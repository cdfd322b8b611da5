/** The range of Young's modulus found for printed parts of a material, GPa. */
export type ModulusRange = { low: number; typical: number; high: number };

export type PrintedMaterial = 'PLA' | 'PETG' | 'ABS' | 'ASA';

/**
 * Young's modulus of printed parts, GPa. Printed parts are stiffer along their lines than across, and makers'
 * figures differ: hence ranges. Sources: PLA and PETG: additive.tools (printed, XY 3–4 and 2–3 GPa) and makers'
 * data sheets (from memory); ABS: PMC10406103 table 2 (1443 MPa by ISO 527-2) and from memory; ASA: from memory.
 */
export const PRINTED_MODULUS_GPA: Readonly<Record<PrintedMaterial, ModulusRange>> = {
  PLA: { low: 2.0, typical: 2.3, high: 3.6 },
  PETG: { low: 1.5, typical: 1.9, high: 2.3 },
  ABS: { low: 1.4, typical: 1.9, high: 2.4 },
  ASA: { low: 1.5, typical: 1.8, high: 2.3 },
};

/** From the middle of the widest range (PLA) to either end, as a factor: √(3.6 / 2.0) = 1.34. */
export const PRINTED_MODULUS_SPREAD = Math.sqrt(PRINTED_MODULUS_GPA.PLA.high / PRINTED_MODULUS_GPA.PLA.low);

/** Whether a modulus is one of plastic: under 6 GPa. Woods begin at about 7 GPa along the grain. */
export function isPrintedPlastic(youngsModulusGPa: number): boolean {
  return youngsModulusGPa < 6;
}
