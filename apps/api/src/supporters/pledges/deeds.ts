import type { PledgeDeed } from '@windchest/contracts';
import type { PledgeRecord } from './pledge-record.js';

type Facts = Pick<PledgeRecord, 'state' | 'endsAt' | 'endWish' | 'pauseWish' | 'nextPlanId'>;

/** Whether the last month is settled; the payment service may not know of the wish yet. */
export const isEnding = ({ endsAt, endWish }: Pick<PledgeRecord, 'endsAt' | 'endWish'>): boolean =>
  endWish === 'end' || (endsAt !== null && endWish !== 'keep');

/** What a supporter can do with a pledge that stands so. */
export const deedsOf = (pledge: Facts): PledgeDeed[] => {
  const card: PledgeDeed[] = ['card'];
  switch (pledge.state) {
    case 'opening':
      return ['give-up'];
    case 'current':
      if (isEnding(pledge)) return ['keep', 'card'];
      return [
        'change-plan',
        ...(pledge.nextPlanId ? (['keep-plan'] as const) : []),
        pledge.pauseWish === 'pause' ? 'resume' : 'pause',
        'end',
        ...card,
      ];
    case 'grace':
      return isEnding(pledge) ? card : ['end', ...card];
    case 'paused':
      if (isEnding(pledge)) return card;
      return pledge.pauseWish === 'resume' ? ['end', ...card] : ['resume', 'end', ...card];
    case 'lapsed':
    case 'ended':
      return [];
  }
};
