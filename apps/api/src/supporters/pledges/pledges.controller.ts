import { Controller } from '@nestjs/common';
import type { Answer, Handled, Pledge } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../../http/person.js';
import { ChangeCard } from './change-card.js';
import { ChangePledge } from './change-pledge.js';
import { OpenPledge } from './open-pledge.js';
import { OwnPledges } from './own-pledges.js';
import { RefreshPledge } from './refresh-pledge.js';

@Controller()
export class PledgesController {
  constructor(
    private readonly own: OwnPledges,
    private readonly opening: OpenPledge,
    private readonly refreshing: RefreshPledge,
    private readonly changing: ChangePledge,
    private readonly card: ChangeCard,
  ) {}

  @Endpoint('GET /account/pledges')
  list(
    @ThisPerson() person: SignedIn,
    @Input() { query }: Handled<'GET /account/pledges'>,
  ): Promise<Answer<'GET /account/pledges'>> {
    return this.own.list(person, query.page);
  }

  @Endpoint('POST /pledges')
  open(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'POST /pledges'>,
  ): Promise<Answer<'POST /pledges'>> {
    return this.opening.open(body, person);
  }

  @Endpoint('GET /pledges/:pledgeId')
  read(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'GET /pledges/:pledgeId'>,
  ): Promise<Pledge> {
    return this.own.show(params.pledgeId, person);
  }

  @Endpoint('GET /pledges/:pledgeId/payments')
  payments(
    @ThisPerson() person: SignedIn,
    @Input() { params, query }: Handled<'GET /pledges/:pledgeId/payments'>,
  ): Promise<Answer<'GET /pledges/:pledgeId/payments'>> {
    return this.own.payments(params.pledgeId, person, query);
  }

  @Endpoint('POST /pledges/:pledgeId/refresh')
  refresh(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /pledges/:pledgeId/refresh'>,
  ): Promise<Pledge> {
    return this.refreshing.refresh(params.pledgeId, person);
  }

  @Endpoint('POST /pledges/:pledgeId/give-up')
  giveUp(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /pledges/:pledgeId/give-up'>,
  ): Promise<Pledge> {
    return this.refreshing.giveUp(params.pledgeId, person);
  }

  @Endpoint('PUT /pledges/:pledgeId/plan')
  changePlan(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'PUT /pledges/:pledgeId/plan'>,
  ): Promise<Pledge> {
    return this.changing.changePlan(input, person);
  }

  @Endpoint('DELETE /pledges/:pledgeId/plan')
  keepPlan(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /pledges/:pledgeId/plan'>,
  ): Promise<Pledge> {
    return this.changing.keepPlan(params.pledgeId, person);
  }

  @Endpoint('POST /pledges/:pledgeId/pause')
  pause(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'POST /pledges/:pledgeId/pause'>,
  ): Promise<Pledge> {
    return this.changing.pause(params.pledgeId, person, body.months);
  }

  @Endpoint('POST /pledges/:pledgeId/resume')
  resume(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /pledges/:pledgeId/resume'>,
  ): Promise<Pledge> {
    return this.changing.resume(params.pledgeId, person);
  }

  @Endpoint('POST /pledges/:pledgeId/end')
  end(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /pledges/:pledgeId/end'>,
  ): Promise<Pledge> {
    return this.changing.end(params.pledgeId, person);
  }

  @Endpoint('POST /pledges/:pledgeId/keep')
  keep(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /pledges/:pledgeId/keep'>,
  ): Promise<Pledge> {
    return this.changing.keep(params.pledgeId, person);
  }

  @Endpoint('POST /pledges/:pledgeId/card')
  openCardPage(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'POST /pledges/:pledgeId/card'>,
  ): Promise<Answer<'POST /pledges/:pledgeId/card'>> {
    return this.card.open(params.pledgeId, person, body.attempt);
  }
}
