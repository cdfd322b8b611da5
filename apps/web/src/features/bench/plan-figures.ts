import type { PrinterCardFields, PrintSheetPart, PrintSpecification } from '@windchest/contracts';
import { filamentCost, filamentOf, materialNamed, type Plate, spoolsFor, usual } from '@windchest/plates';
import type { PartEstimate } from './plates-work.js';

type CardMaterials = PrinterCardFields['materials'];
const isSame = (a: string, b: string) => a.trim().toLowerCase() === b.trim().toLowerCase();

export interface PiecesOfPart {
  code: string;
  quantity: number;
  isLaid: boolean;
}

/** What lies on some plates, by code. */
export function piecesOn(plates: readonly Plate[]): PiecesOfPart[] {
  const pieces = new Map<string, PiecesOfPart>();
  for (const { code, laidAxis } of plates.flatMap(({ placements }) => placements)) {
    const known = pieces.get(code);
    if (known) known.quantity += 1;
    else pieces.set(code, { code, quantity: 1, isLaid: laidAxis !== undefined });
  }
  return [...pieces.values()].sort((a, b) => (a.code < b.code ? -1 : 1));
}

/** What a part is printed in, as the maker says. */
export const makersMaterial = (part: PrintSheetPart, kit: PrintSpecification): string =>
  (part.printSpec ?? kit).material;

/**
 * The filament to figure with until another is chosen: the maker's, if it is on the card; else the card's first.
 * A part with a material of its own has it for a reason, so that one stays.
 */
export function usualFilament(makers: string, kit: PrintSpecification, card: CardMaterials): string {
  const onCard = card.find(({ material }) => isSame(material, makers));
  if (onCard) return onCard.material;
  return isSame(makers, kit.material) ? (card[0]?.material ?? makers) : makers;
}

/** Mass and length of a volume; null in a material whose weight nobody knows. */
export function weightOf(volumeMm3: number, material: string): { massG: number; lengthM: number } | null {
  const known = materialNamed(material);
  return known
    ? filamentOf(volumeMm3, { densityGPerCm3: known.densityGPerCm3, diameterMm: usual.filamentMm })
    : null;
}

export interface FilamentNeed {
  makers: string;
  printedIn: string;
  isOnCard: boolean;
  /** Null where nobody knows what the material weighs. */
  weight: { massG: number; lengthM: number } | null;
  spools: number | null;
  /** Rounded, so that what is shown adds up; null also where the card has no price. */
  costMinor: number | null;
}

export interface NeedsQuestion {
  pieces: readonly PiecesOfPart[];
  parts: readonly PrintSheetPart[];
  estimates: ReadonlyMap<string, PartEstimate>;
  printSpec: PrintSpecification;
  card: CardMaterials;
  /** What the person prints in, by the maker's material. */
  chosen: Readonly<Record<string, string>>;
  spoolG: number;
}

/** Filament for some pieces, one entry for each material the maker prints in. */
export function filamentNeeds(question: NeedsQuestion): FilamentNeed[] {
  const { pieces, parts, estimates, printSpec, card, chosen, spoolG } = question;
  const volumes = new Map<string, number>();
  for (const part of parts) {
    const quantity = pieces.find(({ code }) => code === part.code)?.quantity ?? 0;
    const estimate = estimates.get(part.code);
    if (quantity === 0 || !estimate) continue;
    const makers = makersMaterial(part, printSpec);
    volumes.set(makers, (volumes.get(makers) ?? 0) + quantity * estimate.volumeMm3);
  }
  return [...volumes].map(([makers, volumeMm3]) => {
    const printedIn = chosen[makers] ?? usualFilament(makers, printSpec, card);
    const onCard = card.find(({ material }) => isSame(material, printedIn));
    const weight = weightOf(volumeMm3, printedIn);
    const pricePerKg = onCard?.pricePerKgMinor ?? undefined;
    const cost = weight && filamentCost(weight.massG, { ...(pricePerKg !== undefined && { pricePerKg }) });
    return {
      makers,
      printedIn,
      isOnCard: onCard !== undefined,
      weight,
      spools: weight && spoolsFor(weight.massG, spoolG),
      costMinor: cost === null ? null : Math.round(cost),
    };
  });
}

/** Hours for some pieces, as a range; pieces without an estimate are left out. */
export function hoursOf(
  pieces: readonly PiecesOfPart[],
  estimates: ReadonlyMap<string, PartEstimate>,
): { low: number; high: number } {
  let [low, high] = [0, 0];
  for (const { code, quantity } of pieces) {
    const minutes = estimates.get(code)?.minutes;
    low += (quantity * (minutes?.low ?? 0)) / 60;
    high += (quantity * (minutes?.high ?? 0)) / 60;
  }
  return { low, high };
}

/** The sum of what is known; null where nothing is. */
export const sumOf = (figures: readonly (number | null | undefined)[]): number | null => {
  const known = figures.filter((one) => one !== null && one !== undefined);
  return known.length > 0 ? known.reduce((sum, one) => sum + one, 0) : null;
};
