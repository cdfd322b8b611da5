import type { Pledge } from '@windchest/contracts';
import { ownPledgeTexts as texts } from '../../config/texts/pledge.js';
import { date, price } from '../../lib/format.js';
import type { SignName } from '../../ui/sign.js';

export const pledgeSigns: Record<Pledge['state'], SignName> = {
  opening: 'wait',
  current: 'ok',
  grace: 'warn',
  paused: 'wait',
  lapsed: 'none',
  ended: 'none',
};

const day = (moment: string | null): string => (moment ? date(moment) : '');

/** How a pledge stands and what happens next, in a sentence or two. */
export function leadOf(pledge: Pledge): string {
  const { amount, paidUntil, nextPaymentAt, endsAt, pausedUntil, graceUntil, endedAt, nextPlan } = pledge;
  const next = price(nextPlan?.amount ?? amount);
  switch (pledge.state) {
    case 'opening':
      return texts.openingLead;
    case 'current':
      if (endsAt) return texts.endingLead(day(endsAt));
      return pausedUntil
        ? texts.pausingLead(day(paidUntil), day(pausedUntil), next)
        : texts.currentLead(day(nextPaymentAt ?? paidUntil), next);
    case 'grace':
      return texts.graceLead(next, day(graceUntil));
    case 'paused':
      return nextPaymentAt ? texts.pausedLead(day(nextPaymentAt), next) : texts.pausedOpenLead;
    case 'lapsed':
      return texts.lapsedLead(day(graceUntil ?? endedAt));
    case 'ended':
      return texts.endedLead(day(endedAt));
  }
}

/** What becomes of the shelf when the pledge is over, or rests. */
export const staysWords = ({ keepsAfter, beganAt }: Pledge): string => texts.stays[keepsAfter](day(beganAt));
export const restsWords = ({ keepsAfter, beganAt }: Pledge): string => texts.rests[keepsAfter](day(beganAt));

/** A pledge that is not over. */
export const isLive = ({ state }: Pick<Pledge, 'state'>): boolean => state !== 'lapsed' && state !== 'ended';
