import type { PledgeState } from '@windchest/contracts';
import type { PledgeRecord } from './pledge-record.js';

/** What a pledge lets its supporter fetch. */
export interface PledgeRights {
  /** Every released revision of the plan's kits, new ones at once. */
  readonly isWhole: boolean;
  /** Nothing new, but it comes back: a pause, or a payment in dispute. */
  readonly isResting: boolean;
  /** Of what cannot be fetched any more as a whole: what was released in this time stays. Null: nothing does. */
  readonly kept: { readonly releasedFrom: Date | null; readonly releasedBefore: Date } | null;
}

const WHOLE: ReadonlySet<PledgeState> = new Set(['current', 'grace']);

/**
 * @param at when the right to the whole ended, or ends now
 */
export const rightsOf = (
  { state, keepsAfter, beganAt }: Pick<PledgeRecord, 'state' | 'keepsAfter' | 'beganAt'>,
  isDisputed: boolean,
  at: Date,
): PledgeRights => {
  // Money that the bank may take back, or took back, buys nothing until it is clear whose it is.
  if (isDisputed) return { isWhole: false, isResting: state !== 'lapsed' && state !== 'ended', kept: null };
  const kept =
    keepsAfter === 'nothing'
      ? null
      : { releasedFrom: keepsAfter === 'released-during' ? beganAt : null, releasedBefore: at };
  return { isWhole: WHOLE.has(state), isResting: state === 'paused', kept };
};
