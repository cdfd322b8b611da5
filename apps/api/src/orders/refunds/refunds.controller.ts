import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../../http/person.js';
import { TakeOffFlag } from '../take-off-flag.js';
import { AskForRefund } from './ask-for-refund.js';
import { DecideRights } from './decide-rights.js';

@Controller()
export class RefundsController {
  constructor(
    private readonly asking: AskForRefund,
    private readonly deciding: DecideRights,
    private readonly flags: TakeOffFlag,
  ) {}

  @Endpoint('POST /workshop/orders/:orderId/refunds')
  ask(
    @Input() { params, body }: Handled<'POST /workshop/orders/:orderId/refunds'>,
    @ThisPerson() person: SignedIn,
  ): Promise<Answer<'POST /workshop/orders/:orderId/refunds'>> {
    return this.asking.ask(params.orderId, body, person);
  }

  @Endpoint('PUT /workshop/orders/:orderId/refunds/:refundId/entitlements')
  decide(
    @Input() input: Handled<'PUT /workshop/orders/:orderId/refunds/:refundId/entitlements'>,
    @ThisPerson() person: SignedIn,
  ): Promise<Answer<'PUT /workshop/orders/:orderId/refunds/:refundId/entitlements'>> {
    return this.deciding.decide(input, person);
  }

  @Endpoint('DELETE /workshop/orders/:orderId/flags/:flag')
  takeOffFlag(
    @Input() { params }: Handled<'DELETE /workshop/orders/:orderId/flags/:flag'>,
    @ThisPerson() person: SignedIn,
  ): Promise<void> {
    return this.flags.takeOff(params.orderId, params.flag, person);
  }
}
