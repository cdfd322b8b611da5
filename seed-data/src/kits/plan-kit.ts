import type {
  DemoClearance,
  DemoKit,
  DemoPart,
  DemoRevision,
  DemoVoice,
  KitPlan,
  PlannedPart,
} from '../demo-types.js';
import type { Solid } from '../geometry/solid.js';

type PartWords = Pick<DemoPart, 'code' | 'name' | 'orientation'> & Partial<Omit<DemoPart, 'fileName'>>;

/**
 * A part with its file's name made from its code and name: `P-73-pipe-c-sharp-5.stl`; in another clearance
 * `J-01-locking-tongue-(plus).stl`.
 */
export function plannedPart(
  words: PartWords,
  shape: () => Solid,
  variantShapes: PlannedPart['variantShapes'] = {},
): PlannedPart {
  const fileFormat = words.fileFormat ?? 'stl';
  const stem = words.name
    .replaceAll('♯', '-sharp-')
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, '-')
    .replaceAll(/^-|-$/g, '');
  return {
    shape,
    variantShapes,
    part: {
      quantity: 1,
      printSpec: null,
      voice: null,
      isGauge: false,
      ...words,
      fileFormat,
      fileName: `${words.code}-${stem}.${fileFormat}`,
      variants: (Object.keys(variantShapes) as DemoClearance[]).map((clearance) => ({
        clearance,
        fileName: `${words.code}-${stem}-(${clearance}).${fileFormat}`,
      })),
    },
  };
}

type RevisionWords = Omit<DemoRevision, 'label' | 'state' | 'parts'> & { planned: readonly PlannedPart[] };

export function planKit(words: Omit<DemoKit, 'revisions'>, revisions: readonly RevisionWords[]): KitPlan {
  const planned = new Map<string, readonly PlannedPart[]>();
  const plain = revisions.map(({ planned: parts, ...revision }): DemoRevision => {
    const label = `Mk ${revision.mark}.${revision.issue}`;
    planned.set(label, parts);
    return { ...revision, label, state: 'released', parts: parts.map(({ part }) => part) };
  });
  return { kit: { ...words, revisions: plain }, planned };
}

/** The room for which all kits of the workshop are voiced. */
export const workshopRoom = { temperatureC: 20 } as const;

/** The build volume that every kit of the workshop keeps to. */
export const workshopBuildVolume = { xMm: 220, yMm: 220, zMm: 250 } as const;

/** Lengths are drawn to 0.01 mm: finer than any printer, and at most a third of a cent on the shortest pipe. */
export const toHundredthMm = (mm: number) => Math.round(mm * 100) / 100;

export function withLength<V extends DemoVoice & { lengthMm: number }>(voice: V, lengthMm: number): V {
  return { ...voice, lengthMm: toHundredthMm(lengthMm) };
}
