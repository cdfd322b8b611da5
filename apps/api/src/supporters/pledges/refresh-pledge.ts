import { Injectable } from '@nestjs/common';
import type { Pledge as PledgeAnswer } from '@windchest/contracts';
import { PaymentsUnreachable } from '../../adapters/payments/payments.js';
import type { SignedIn } from '../../http/person.js';
import { RateLimits } from '../../http/rate-limits.js';
import { Refusal } from '../../http/refusal.js';
import { LIVE_STATES } from './follow-pledge.js';
import { GiveUpPledge } from './give-up-pledge.js';
import { LookAtPledge } from './look-at-pledge.js';
import { OwnPledges } from './own-pledges.js';
import { serviceAway } from './service-away.js';

/** The supporter is back from a page of the payment service, or does not want it any more. */
@Injectable()
export class RefreshPledge {
  constructor(
    private readonly own: OwnPledges,
    private readonly looking: LookAtPledge,
    private readonly givingUp: GiveUpPledge,
    private readonly limits: RateLimits,
  ) {}

  async refresh(pledgeId: string, person: SignedIn): Promise<PledgeAnswer> {
    const pledge = await this.own.find(pledgeId, person);
    if (LIVE_STATES.includes(pledge.state)) {
      await this.limits.take('checkout', `pledge-refresh:${pledgeId}`);
      try {
        await this.looking.look(pledgeId);
      } catch (fault) {
        if (fault instanceof PaymentsUnreachable) throw serviceAway();
        throw fault;
      }
    }
    return this.own.show(pledgeId, person);
  }

  async giveUp(pledgeId: string, person: SignedIn): Promise<PledgeAnswer> {
    const pledge = await this.own.find(pledgeId, person);
    if (pledge.state !== 'opening')
      throw new Refusal('pledge-cannot', 'This pledge has begun, or is over. Nothing was changed.');
    await this.givingUp.giveUp(pledge);
    return this.own.show(pledgeId, person);
  }
}
