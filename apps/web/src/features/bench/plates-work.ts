import type { PrintSheetPart, PrintSpecification } from '@windchest/contracts';
import {
  type Bed,
  estimateFromProfile,
  type Fit,
  fitPart,
  materials,
  packPlates,
  type Plate,
  PlatesError,
  usual,
} from '@windchest/plates';

export interface PlatesQuestion {
  parts: readonly PrintSheetPart[];
  /** Of parts without settings of their own. */
  printSpec: PrintSpecification;
  bed: Bed;
  gapMm: number;
  marginMm: number;
}

/** For one print of one part. What it weighs depends on the filament chosen. */
export interface PartEstimate {
  volumeMm3: number;
  minutes: { low: number; high: number };
  mayBeOffPercent: number;
}

export interface PartOnPrinter {
  code: string;
  /** By the bed alone, as the part's rule allows. */
  fit: Fit;
  /** Laid so that it is taller than as drawn. */
  isStood: boolean;
  /** It fits the bed, but not with this free edge. */
  isKeptOffByMargin: boolean;
  /** Null where nobody has its profile, or its settings make no sense. */
  estimate: PartEstimate | null;
}

export interface PlatesAnswer {
  parts: PartOnPrinter[];
  plates: readonly Plate[];
}

const sizeOf = ({ sizeMm: { x, y, z } }: PrintSheetPart) => [x, y, z] as const;

/** Fit, plates and estimates of some parts on one printer. Takes up to seconds: the work of a worker. */
export function workOutPlates(
  { parts, printSpec, bed, gapMm, marginMm }: PlatesQuestion,
  onProgress?: (done: number) => void,
): PlatesAnswer {
  const { plates, tooBig } = packPlates(
    parts.map((part) => ({
      code: part.code,
      quantity: part.quantity,
      heightMm: part.heightMm,
      orientation: part.orientation,
      sizeMm: sizeOf(part),
      ...(part.footprint && { footprint: part.footprint }),
    })),
    bed,
    { gapMm, marginMm, ...(onProgress && { onProgress }) },
  );
  return {
    plates,
    parts: parts.map((part) => {
      const sizeMm = sizeOf(part);
      const { orientation, footprint } = part;
      const fit = fitPart({ sizeMm, orientation, ...(footprint && { footprint }) }, bed);
      const uprightMm = fit.laidAxis === undefined ? part.heightMm : sizeMm[fit.laidAxis === 'x' ? 0 : 1];
      return {
        code: part.code,
        fit,
        isStood: uprightMm > part.heightMm,
        isKeptOffByMargin: fit.fit !== 'too-big' && tooBig.includes(part.code),
        estimate: estimateOf(part, part.printSpec ?? printSpec),
      };
    }),
  };
}

/** The volume of filament and the time are the same in any material; PLA stands in for the one chosen later. */
function estimateOf({ profile }: PrintSheetPart, spec: PrintSpecification): PartEstimate | null {
  if (!profile) return null;
  try {
    const { volumeMm3, minutes, mayBeOffPercent } = estimateFromProfile(profile, spec, {
      densityGPerCm3: materials.PLA.densityGPerCm3,
      diameterMm: usual.filamentMm,
    });
    return { volumeMm3, minutes, mayBeOffPercent };
  } catch (thrown) {
    if (thrown instanceof PlatesError) return null;
    throw thrown;
  }
}
