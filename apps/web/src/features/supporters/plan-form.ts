import type { KeepsAfter, WorkshopPlan } from '@windchest/contracts';
import { amountText, readAmount } from '../../lib/amount-text.js';

export interface PlanForm {
  name: string;
  words: string;
  /** As it is typed: `9.00`. */
  amountMinor: string;
  scope: 'all' | 'some';
  kitIds: string[];
  keepsAfter: KeepsAfter;
  isOffered: boolean;
}

export const planForm = (plan: WorkshopPlan | null): PlanForm => ({
  name: plan?.name ?? '',
  words: plan?.words ?? '',
  amountMinor: plan ? amountText(plan.amount) : '',
  scope: plan?.hasAllKits ? 'all' : 'some',
  kitIds: plan && !plan.hasAllKits ? plan.kits.map(({ id }) => id) : [],
  keepsAfter: plan?.keepsAfter ?? 'released-during',
  isOffered: plan?.isOffered ?? true,
});

/** In the shape of the contract; an amount that cannot be read becomes NaN, which the contract refuses. */
export const planBodyOf =
  (currency: string) =>
  ({ amountMinor, scope, kitIds, ...rest }: PlanForm): unknown => {
    const read = readAmount(amountMinor, currency);
    return {
      ...rest,
      amountMinor: 'minor' in read ? read.minor : NaN,
      hasAllKits: scope === 'all',
      kitIds: scope === 'all' ? [] : kitIds,
    };
  };
