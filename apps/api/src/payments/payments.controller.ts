import { Controller, Headers, Req, type RawBodyRequest } from '@nestjs/common';
import type { Answer } from '@windchest/contracts';
import type { Request } from 'express';
import { Endpoint } from '../http/endpoint.js';
import { ReceivePaymentEvent } from './receive-payment-event.js';

@Controller()
export class PaymentsController {
  constructor(private readonly events: ReceivePaymentEvent) {}

  @Endpoint('POST /payments/webhook')
  async receive(
    @Req() request: RawBodyRequest<Request>,
    @Headers('stripe-signature') signature: string | undefined,
  ): Promise<Answer<'POST /payments/webhook'>> {
    await this.events.receive(request.rawBody, signature);
    return { received: true };
  }
}
