import { Controller, Ip } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../http/endpoint.js';
import { MaybePerson, type SignedIn } from '../http/person.js';
import { OpenCheckout } from './open-checkout.js';
import { QuoteBasket } from './quote-basket.js';

@Controller()
export class CheckoutController {
  constructor(
    private readonly basket: QuoteBasket,
    private readonly checkout: OpenCheckout,
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
}
