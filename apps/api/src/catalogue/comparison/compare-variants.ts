import { clearances, clearanceSigns, type Clearance, type Comparison } from '@windchest/contracts';
import { fileAt, filesOfPart, hasVariants } from '../revisions/part-files.js';
import type { PartOfRevision } from '../revisions/revision-contents.js';
import { comparePart, meshPairOf, type PartDifference } from './compare-parts.js';
import type { Knowledge } from './mesh-comparisons.js';

type Row = Comparison['rows'][number];
type Variant = Row['variants'][number];

/**
 * A part that comes in several clearances is compared clearance by clearance, and counts as changed where
 * one of them is. A clearance that comes or goes changes nothing that anybody has printed: it is told, no more.
 */
export const compareVariants = (
  before: PartOfRevision | null,
  after: PartOfRevision | null,
  known: Knowledge = () => ({ state: 'waiting' }),
): PartDifference & Pick<Row, 'variants'> => {
  const compare = (old: PartOfRevision | null, now: PartOfRevision | null): PartDifference => {
    const pair = meshPairOf(old, now);
    return comparePart(old, now, pair ? known(pair) : undefined);
  };
  const whole = compare(before, after);
  if (![before, after].some((part) => part && hasVariants(part))) return { ...whole, variants: [] };
  const each = clearances.flatMap((clearance) => {
    const [old, now] = [before, after].map((part) => part && withFileOf(part, clearance));
    if (!old && !now) return [];
    // Another quantity is told once, of the part.
    const difference = compare(old ?? null, now && old ? { ...now, quantity: old.quantity } : (now ?? null));
    return [{ clearance, ...difference, ...(before && after ? cameOrWent(difference) : {}) }];
  });
  const variants = each.map(({ clearance, difference, whatDiffers }) => ({
    clearance,
    difference,
    whatDiffers,
  }));
  if (!before || !after) return { ...whole, variants };
  const strongest = strength.find((kind) => each.some((one) => one.difference === kind)) ?? 'same';
  // Figures are those of the zero where it is among the strongest: the drawn size of the part.
  const strong = each.filter((one) => one.difference === strongest);
  const told = strong.find((one) => one.clearance === 'zero') ?? strong[0];
  const { sizeChangeMm, volumeChangePercent, areaChangePercent } = told ?? whole;
  // Nothing is certain while one of them is still being compared.
  const waiting = each.find(({ deviation }) => deviation?.state === 'waiting');
  const deviation = deviationIn(waiting ?? told);
  const pieces = before.quantity === after.quantity ? '' : `${before.quantity} → ${after.quantity} pieces`;
  return {
    difference: strongest,
    whatDiffers: [wordsOf(variants), pieces].filter((words) => words !== '').join(', '),
    sizeChangeMm,
    volumeChangePercent,
    areaChangePercent,
    deviation,
    variants,
  };
};

/** Says in which clearance it is. */
const deviationIn = (
  one: (PartDifference & { readonly clearance: Clearance }) | undefined,
): PartDifference['deviation'] =>
  one?.deviation
    ? {
        ...one.deviation,
        clearance: one.clearance,
        where: `in ${clearanceSigns[one.clearance]}: ${one.deviation.where}`,
      }
    : null;

/** Those that weigh; a clearance that is new or dropped does not. */
const strength: readonly Row['difference'][] = ['changed', 're-exported'];

/** A part as somebody prints it who prints in this clearance; as it is where nothing is known of that. */
export const asPrinted = (part: PartOfRevision | null, clearance: Clearance | null): PartOfRevision | null =>
  part && clearance ? { ...part, file: fileAt(part, clearance), variants: [] } : part;

/** The part as it is in one clearance; null where it does not come in it. */
const withFileOf = (part: PartOfRevision, clearance: Clearance): PartOfRevision | null =>
  filesOfPart(part).some((one) => one.clearance === clearance)
    ? { ...part, file: fileAt(part, clearance) }
    : null;

const cameOrWent = ({ difference }: PartDifference): Partial<PartDifference> => {
  if (difference === 'new') return { whatDiffers: 'a new clearance' };
  return difference === 'dropped' ? { whatDiffers: 'no longer in this clearance' } : {};
};

/** Clearances that differ alike are told together, what changed first: `in 0: −0.20 mm width; in − and +: a new clearance`. */
const wordsOf = (variants: readonly Variant[]): string => {
  const isChanged = ({ difference }: Variant): boolean => strength.includes(difference);
  const alike = new Map<string, string[]>();
  for (const { clearance, whatDiffers } of [
    ...variants.filter(isChanged),
    ...variants.filter((one) => !isChanged(one)),
  ])
    if (whatDiffers !== '')
      alike.set(whatDiffers, [...(alike.get(whatDiffers) ?? []), clearanceSigns[clearance]]);
  const [only, ...others] = alike;
  if (only && others.length === 0 && only[1].length === variants.length) return only[0];
  return [...alike].map(([words, signs]) => `in ${allOf(signs)}: ${words}`).join('; ');
};

const allOf = (signs: readonly string[]): string =>
  signs.length < 2 ? signs.join('') : `${signs.slice(0, -1).join(', ')} and ${signs.at(-1)}`;
