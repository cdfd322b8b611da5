export type MaterialName = 'PLA' | 'PETG' | 'ABS' | 'ASA' | 'TPU' | 'PA';

export interface MaterialDensity {
  readonly name: MaterialName;
  readonly densityGPerCm3: number;
  /** Least and greatest density found among sold filaments of the kind. */
  readonly spreadGPerCm3: readonly [number, number];
  readonly sources: readonly string[];
  readonly note?: string;
}

const PROFILES = 'PrusaSlicer 2.5.0 filament profiles';
const FDM_MATERIALS = 'Ultimaker/fdm_materials, commit 0f81b3bd';
const SPOOLMAN = 'Donkie/SpoolmanDB materials.json, commit ca553475';

/** Densities of filament at room temperature, in g/cm³, with where they were read. */
export const materials: Readonly<Record<MaterialName, MaterialDensity>> = {
  PLA: {
    name: 'PLA',
    densityGPerCm3: 1.24,
    spreadGPerCm3: [0.8, 2.3],
    sources: [
      `${PROFILES}: 1.24`,
      `${FDM_MATERIALS}: 1.24`,
      `${SPOOLMAN}: 1.24, median of 148 products 1.24`,
    ],
    note: 'The lightest are foamed, the heaviest filled with metal or minerals; nine in ten lie within 1.15 to 1.33.',
  },
  PETG: {
    name: 'PETG',
    densityGPerCm3: 1.27,
    spreadGPerCm3: [1.2, 1.41],
    sources: [`${PROFILES}: 1.27`, `${FDM_MATERIALS}: 1.27`, `${SPOOLMAN}: 1.27, median of 56 products 1.27`],
  },
  ABS: {
    name: 'ABS',
    densityGPerCm3: 1.04,
    spreadGPerCm3: [1.01, 1.27],
    sources: [`${PROFILES}: 1.04`, `${FDM_MATERIALS}: 1.10`, `${SPOOLMAN}: 1.04, median of 26 products 1.05`],
    note: 'The sources disagree by 6 %.',
  },
  ASA: {
    name: 'ASA',
    densityGPerCm3: 1.07,
    spreadGPerCm3: [0.99, 1.13],
    sources: [`${PROFILES}: 1.07`, `${FDM_MATERIALS}: 1.06`, `${SPOOLMAN}: 1.05, median of 19 products 1.07`],
  },
  TPU: {
    name: 'TPU',
    densityGPerCm3: 1.22,
    spreadGPerCm3: [1.12, 1.26],
    sources: [`${PROFILES}: 1.22`, `${FDM_MATERIALS}: 1.22`, `${SPOOLMAN}: median of 14 products 1.205`],
  },
  PA: {
    name: 'PA',
    densityGPerCm3: 1.14,
    spreadGPerCm3: [1.01, 1.33],
    sources: [
      `${FDM_MATERIALS}: 1.14`,
      `${PROFILES}: 1.11 (PA11 with carbon fibre)`,
      `${SPOOLMAN}: median of 9 products 1.17`,
    ],
    note: 'A family: from 1.01 (PA12) to over 1.2 (PA6).',
  },
};

/** The material a label names, whatever its letters' size; undefined where nobody knows its density. */
export function materialNamed(label: string): MaterialDensity | undefined {
  const name = label.trim().toUpperCase();
  return Object.hasOwn(materials, name) ? materials[name as MaterialName] : undefined;
}
