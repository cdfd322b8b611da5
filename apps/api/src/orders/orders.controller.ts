import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../http/endpoint.js';
import { MaybePerson, ThisPerson, type SignedIn } from '../http/person.js';
import { CancelOrder } from './cancel-order.js';
import { ListOrders } from './list-orders.js';
import { OwnOrders } from './own-orders.js';
import { RefreshOrder } from './refresh-order.js';
import { ShowOrder } from './show-order.js';

@Controller()
export class OrdersController {
  constructor(
    private readonly own: OwnOrders,
    private readonly refreshing: RefreshOrder,
    private readonly cancelling: CancelOrder,
    private readonly listing: ListOrders,
    private readonly showing: ShowOrder,
  ) {}

  @Endpoint('GET /orders/:orderId')
  read(
    @Input() { params, query }: Handled<'GET /orders/:orderId'>,
    @MaybePerson() person: SignedIn | null,
  ): Promise<Answer<'GET /orders/:orderId'>> {
    return this.own.show(params.orderId, person, query.key);
  }

  @Endpoint('POST /orders/:orderId/refresh')
  refresh(
    @Input() { params, query }: Handled<'POST /orders/:orderId/refresh'>,
    @MaybePerson() person: SignedIn | null,
  ): Promise<Answer<'POST /orders/:orderId/refresh'>> {
    return this.refreshing.refresh(params.orderId, person, query.key);
  }

  @Endpoint('POST /orders/:orderId/cancel')
  cancel(
    @Input() { params, query }: Handled<'POST /orders/:orderId/cancel'>,
    @MaybePerson() person: SignedIn | null,
  ): Promise<Answer<'POST /orders/:orderId/cancel'>> {
    return this.cancelling.cancel(params.orderId, person, query.key);
  }

  @Endpoint('GET /account/orders')
  listOwn(
    @Input() { query }: Handled<'GET /account/orders'>,
    @ThisPerson() person: SignedIn,
  ): Promise<Answer<'GET /account/orders'>> {
    return this.own.list(person, query.page);
  }

  @Endpoint('GET /workshop/orders')
  list(@Input() { query }: Handled<'GET /workshop/orders'>): Promise<Answer<'GET /workshop/orders'>> {
    return this.listing.page(query);
  }

  @Endpoint('GET /workshop/orders/:orderId')
  show(
    @Input() { params }: Handled<'GET /workshop/orders/:orderId'>,
  ): Promise<Answer<'GET /workshop/orders/:orderId'>> {
    return this.showing.show(params.orderId);
  }
}
