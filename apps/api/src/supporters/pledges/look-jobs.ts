import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { z } from 'zod';
import { Clock } from '../../adapters/clock/clock.js';
import { PaymentsRefused, PaymentsUnreachable } from '../../adapters/payments/payments.js';
import { HandlesJob, TryLater, type JobHandler } from '../../jobs/job.js';
import { LIVE_STATES } from './follow-pledge.js';
import { GiveUpPledge } from './give-up-pledge.js';
import { LookAtPledge } from './look-at-pledge.js';
import { FIRST_LOOK_SECONDS, lookAfterPledge, lookAtPledge } from './look-at-pledge.job.js';
import { Pledge } from './pledge.model.js';

const AGAIN_SECONDS = 60;
/** A live pledge is asked about this often even if nothing was heard of it. */
const LONGEST_WAIT_SECONDS = 12 * 3600;
/** After a page's end its last event and a slow clock get this long. */
const AFTER_END_SECONDS = 5;

/** One look at a moment that matters. */
@Injectable()
@HandlesJob(lookAtPledge)
export class LookOnce implements JobHandler<typeof lookAtPledge.payload> {
  constructor(private readonly looking: LookAtPledge) {}

  async handle({ pledgeId }: z.output<typeof lookAtPledge.payload>): Promise<void> {
    try {
      await this.looking.look(pledgeId);
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw new TryLater(AGAIN_SECONDS);
      // The service knows no such pledge any more: asking again changes nothing.
      if (!(fault instanceof PaymentsRefused)) throw fault;
    }
  }
}

/** Asks the payment service itself, again and again, until the pledge is over. */
@Injectable()
@HandlesJob(lookAfterPledge)
export class LookAfterPledge implements JobHandler<typeof lookAfterPledge.payload> {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    private readonly looking: LookAtPledge,
    private readonly givingUp: GiveUpPledge,
    private readonly clock: Clock,
  ) {}

  async handle({ pledgeId }: z.output<typeof lookAfterPledge.payload>): Promise<void> {
    const pledge = await this.pledges.findByPk(pledgeId);
    if (!pledge || !LIVE_STATES.includes(pledge.state)) return;
    if (!pledge.sessionId) return this.endIfForgotten(pledge);
    try {
      await this.looking.look(pledgeId);
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw new TryLater(this.nextLook(pledge));
      throw fault;
    }
    const after = await this.pledges.findByPk(pledgeId);
    if (after && LIVE_STATES.includes(after.state)) throw new TryLater(this.nextLook(after));
  }

  /** It broke off before there was a page to pay on, and the time to go on with it is over. */
  private async endIfForgotten(pledge: Pledge): Promise<void> {
    if (pledge.payUntil && pledge.payUntil > this.clock.now()) throw new TryLater(this.nextLook(pledge));
    await this.givingUp.end(pledge.id, 'no payment page was ever opened');
    const after = await this.pledges.findByPk(pledge.id);
    if (after && LIVE_STATES.includes(after.state)) throw new TryLater(FIRST_LOOK_SECONDS);
  }

  /** While it opens: a quarter of its age, and soon after the page's end. Then twice a day. */
  private nextLook(pledge: Pledge): number {
    if (pledge.state !== 'opening') return LONGEST_WAIT_SECONDS;
    const now = this.clock.now().getTime();
    const age = (now - pledge.createdAt.getTime()) / 1000;
    const wait = Math.min(Math.max(FIRST_LOOK_SECONDS, age / 4), LONGEST_WAIT_SECONDS);
    const toEnd = ((pledge.payUntil?.getTime() ?? 0) - now) / 1000 + AFTER_END_SECONDS;
    return Math.ceil(toEnd > 0 ? Math.min(wait, toEnd) : wait);
  }
}
