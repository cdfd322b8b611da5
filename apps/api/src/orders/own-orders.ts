import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, BuyerOrder } from '@windchest/contracts';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import type { SignedIn } from '../http/person.js';
import { notFound } from '../http/refusal.js';
import { maySeeOrder } from './may-see-order.js';
import { OrderView } from './order-view.js';
import { Order } from './order.model.js';

const PAGE_SIZE = 20;

/** A buyer's own orders. An order that is somebody else's does not exist for them. */
@Injectable()
export class OwnOrders {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly view: OrderView,
    private readonly tokens: LinkTokens,
  ) {}

  /** @throws Refusal `not-found`, alike where there is no such order and where it is not theirs */
  async find(orderId: string, person: SignedIn | null, key: string | undefined): Promise<Order> {
    const order = await this.orders.findByPk(orderId);
    const keyHash = key ? this.tokens.hashOf(key) : null;
    if (!order || !maySeeOrder(order, person, keyHash)) throw notFound('order');
    return order;
  }

  async show(orderId: string, person: SignedIn | null, key: string | undefined): Promise<BuyerOrder> {
    return this.view.one(await this.find(orderId, person, key), person);
  }

  async list(person: SignedIn, page: number): Promise<Answer<'GET /account/orders'>> {
    const { rows, count } = await this.orders.findAndCountAll({
      where: { personId: person.id },
      order: [
        ['createdAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: PAGE_SIZE,
      offset: (page - 1) * PAGE_SIZE,
    });
    return { items: await this.view.many(rows, person), page, size: PAGE_SIZE, total: count };
  }
}
