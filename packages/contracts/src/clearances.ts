import { z } from 'zod';

/**
 * The gap a part is drawn with against the part it goes into: `zero` as the maker means it, `minus` with
 * less of a gap (it fits tighter), `plus` with more (it fits looser).
 */
export const clearances = ['minus', 'zero', 'plus'] as const;
export const clearance = z.enum(clearances);
export type Clearance = z.output<typeof clearance>;

/** A part's own file is its zero; these come beside it. */
export const variantClearances = ['minus', 'plus'] as const;
export const variantClearance = z.enum(variantClearances);
export type VariantClearance = z.output<typeof variantClearance>;

export const clearanceSigns = { minus: '−', zero: '0', plus: '+' } as const satisfies Record<
  Clearance,
  string
>;
