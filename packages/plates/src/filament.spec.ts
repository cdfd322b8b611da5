import { reference } from '../fixtures/reference-prints.js';
import {
  filamentCost,
  filamentOf,
  gramsPerMetre,
  materialNamed,
  materials,
  metresPerKilogram,
  PlatesError,
  spoolsFor,
  type MaterialName,
} from './index.js';

// Conversions and the slicer's own prints of mass and cost: fixtures/filament.json.
describe('filament', () => {
  it.each(reference.conversions.map((row) => [row.material, row.diameter_mm, row] as const))(
    'of %s at %d mm weighs and reaches what the conversions table says',
    (_, diameterMm, row) => {
      const material = { densityGPerCm3: row.density, diameterMm };
      expect(gramsPerMetre(material)).toBeCloseTo(row.g_per_m, 5);
      expect(Math.abs(metresPerKilogram(material) / row.m_per_kg - 1)).toBeLessThan(1e-6);
      expect(Math.abs(filamentOf(1000 * row.area_mm2, material).lengthM - 1)).toBeLessThan(1e-6);
    },
  );

  it('turns the volume of a slicer run into the mass and length that the slicer prints', () => {
    const { massG, lengthM } = filamentOf(2876.2, { densityGPerCm3: 1.24, diameterMm: 1.75 });
    expect(massG).toBeCloseTo(3.566, 3);
    expect(1000 * lengthM).toBeCloseTo(1195.79, 1);
  });

  it('costs its mass times the price of a kilogram', () => {
    expect(filamentCost(3.57, { pricePerKg: 25 })).toBeCloseTo(0.08925, 10);
    expect(filamentCost(3.57, { pricePerKg: 0 })).toBe(0);
    expect(filamentCost(3.57, {})).toBeNull();
  });

  it('is known by the name on its label, however that is written, and by no other word', () => {
    expect(materialNamed(' petg ')).toBe(materials.PETG);
    expect(['PLA silk', '', 'constructor', '__proto__'].map(materialNamed)).toEqual([
      undefined,
      undefined,
      undefined,
      undefined,
    ]);
  });

  it('comes in whole spools', () => {
    expect([0, 1, 999.9, 1000, 1000.1, 2500].map((massG) => spoolsFor(massG))).toEqual([0, 1, 1, 1, 2, 3]);
    expect(spoolsFor(1000, 750)).toBe(2);
    expect(spoolsFor(0.1 + 0.2, 0.3)).toBe(1);
  });

  it('has a density inside the spread of sold filaments, equal to that of the conversions table', () => {
    for (const material of Object.values(materials)) {
      const [least, most] = material.spreadGPerCm3;
      expect(material.densityGPerCm3).toBeGreaterThan(least);
      expect(material.densityGPerCm3).toBeLessThan(most);
      expect(material.sources.length).toBeGreaterThan(0);
    }
    for (const { material, density } of reference.conversions) {
      expect(materials[material as MaterialName].densityGPerCm3).toBe(density);
    }
  });

  it('refuses numbers that make no sense, and names them', () => {
    expect(() => gramsPerMetre({ densityGPerCm3: 0, diameterMm: 1.75 })).toThrow(/density.*is 0/);
    expect(() => gramsPerMetre({ densityGPerCm3: 1.24, diameterMm: NaN })).toThrow(/diameter.*NaN/);
    expect(() => filamentOf(-1, { densityGPerCm3: 1.24, diameterMm: 1.75 })).toThrow(PlatesError);
    expect(() => filamentCost(1, { pricePerKg: -2 })).toThrow(/price.*-2/);
    expect(() => spoolsFor(1, 0)).toThrow(/spool/);
  });
});
