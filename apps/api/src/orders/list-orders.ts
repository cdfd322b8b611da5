import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled } from '@windchest/contracts';
import { literal, Op, type Order as Sorting, type WhereOptions } from 'sequelize';
import { placeOf } from './order-country.js';
import { OrderLine } from './order-line.model.js';
import type { OrderRecord } from './order-record.js';
import { Order } from './order.model.js';

export type OrderQuery = Handled<'GET /workshop/orders'>['query'];
export type OrderFilter = Pick<OrderQuery, 'state' | 'moneyBack' | 'flagged' | 'couponId' | 'search'>;
type Row = Answer<'GET /workshop/orders'>['items'][number];

const PORTION = 500;
const WAS_DISPUTED = 'EXISTS (SELECT 1 FROM disputes d WHERE d.order_id = `Order`.id)';

/** The workshop's list of orders: a page of it for the screen, all of it for an export. */
@Injectable()
export class ListOrders {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    @InjectModel(OrderLine) private readonly lines: typeof OrderLine,
  ) {}

  async page(query: OrderQuery): Promise<Answer<'GET /workshop/orders'>> {
    const direction = query.order === 'asc' ? 'ASC' : 'DESC';
    const column = { placedAt: 'createdAt', total: 'totalMinor', number: 'number' }[query.sort];
    const sorting: Sorting = [
      [column, direction],
      ['id', direction],
    ];
    const { rows, count } = await this.orders.findAndCountAll({
      where: whereOf(query),
      order: sorting,
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    const kits = await this.kitsOf(rows);
    return {
      items: rows.map((order) => toRow(order, kits.get(order.id) ?? [])),
      page: query.page,
      size: query.size,
      total: count,
    };
  }

  /** Newest first, each portion going on below the last row of the one before. */
  async *all(query: OrderFilter): AsyncGenerator<OrderRecord & { kits: string[] }> {
    let last: Order | undefined;
    do {
      const rows: Order[] = await this.orders.findAll({
        where: { [Op.and]: [whereOf(query), last ? below(last) : {}] },
        order: [
          ['createdAt', 'DESC'],
          ['id', 'DESC'],
        ],
        limit: PORTION,
      });
      const kits = await this.kitsOf(rows);
      for (const order of rows)
        yield { ...(order.get({ plain: true }) as OrderRecord), kits: kits.get(order.id) ?? [] };
      last = rows.length === PORTION ? rows.at(-1) : undefined;
    } while (last);
  }

  private async kitsOf(orders: readonly Order[]): Promise<Map<string, string[]>> {
    const kits = new Map<string, string[]>();
    if (orders.length === 0) return kits;
    const lines = await this.lines.findAll({
      where: { orderId: orders.map((order) => order.id) },
      order: [['position', 'ASC']],
    });
    for (const line of lines) kits.set(line.orderId, [...(kits.get(line.orderId) ?? []), line.kitName]);
    return kits;
  }
}

const below = (last: Order): WhereOptions => ({
  [Op.or]: [
    { createdAt: { [Op.lt]: last.createdAt } },
    { createdAt: last.createdAt, id: { [Op.lt]: last.id } },
  ],
});

const whereOf = ({ state, moneyBack, flagged, couponId, search }: OrderFilter): WhereOptions => {
  const like = `%${search ?? ''}%`;
  return {
    ...(state ? { state } : {}),
    ...(couponId ? { couponId } : {}),
    ...(moneyBack === 'refunded' ? { refundedMinor: { [Op.gt]: 0 } } : {}),
    [Op.and]: [
      ...(flagged ? [literal('JSON_LENGTH(flags) > 0')] : []),
      ...(moneyBack === 'disputed' ? [literal(WAS_DISPUTED)] : []),
    ],
    ...(search
      ? {
          [Op.or]: [
            { number: { [Op.like]: `%${search.toUpperCase()}%` } },
            { email: { [Op.like]: like } },
            { receiptNumber: { [Op.like]: like } },
          ],
        }
      : {}),
  };
};

const toRow = (order: Order, kits: string[]): Row => ({
  id: order.id,
  number: order.number,
  state: order.state,
  email: order.email,
  country: placeOf(order).country,
  kits,
  discount: { minor: order.discountMinor, currency: order.currency },
  total: { minor: order.totalMinor, currency: order.currency },
  refunded: { minor: order.refundedMinor, currency: order.currency },
  couponCode: order.couponCode,
  receiptNumber: order.receiptNumber,
  flags: order.flags,
  placedAt: order.createdAt.toISOString(),
  paidAt: order.paidAt?.toISOString() ?? null,
});
