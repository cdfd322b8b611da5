import { Controller, Headers, Ip, Req, type RawBodyRequest } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import type { Request } from 'express';
import { Endpoint, Input } from '../http/endpoint.js';
import { MaybePerson, type SignedIn } from '../http/person.js';
import { OpenCheckout } from './open-checkout.js';
import { QuoteBasket } from './quote-basket.js';
import { ReceivePaymentEvent } from './receive-payment-event.js';

@Controller()
export class CheckoutController {
  constructor(
    private readonly basket: QuoteBasket,
    private readonly checkout: OpenCheckout,
    private readonly events: ReceivePaymentEvent,
  ) {}

  @Endpoint('POST /basket/quote')
  quote(
    @Input() { body }: Handled<'POST /basket/quote'>,
    @MaybePerson() person: SignedIn | null,
    @Ip() network: string,
  ): Promise<Answer<'POST /basket/quote'>> {
    return this.basket.quote(body, person, network);
  }

  @Endpoint('POST /checkout')
  open(
    @Input() { body }: Handled<'POST /checkout'>,
    @MaybePerson() person: SignedIn | null,
    @Ip() network: string,
  ): Promise<Answer<'POST /checkout'>> {
    return this.checkout.open(body, person, network);
  }

  @Endpoint('POST /payments/webhook')
  async receive(
    @Req() request: RawBodyRequest<Request>,
    @Headers('stripe-signature') signature: string | undefined,
  ): Promise<Answer<'POST /payments/webhook'>> {
    await this.events.receive(request.rawBody, signature);
    return { received: true };
  }
}
