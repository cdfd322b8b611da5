import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { ListOrders, type OrderFilter } from './list-orders.js';
import { OrderLine } from './order-line.model.js';
import type { OrderLineRecord, OrderRecord } from './order-record.js';
import { Order } from './order.model.js';
import { OwnOrders } from './own-orders.js';

export interface DaySales {
  /** ISO date, in UTC. */
  readonly day: string;
  readonly orders: number;
  readonly grossMinor: number;
}

export interface KitSales {
  readonly kitId: string;
  /** As it was called when it was last sold. */
  readonly name: string;
  readonly sold: number;
  readonly grossMinor: number;
}

/** Orders for other rooms to read. */
@Injectable()
export class OrdersReader {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Order) private readonly orders: typeof Order,
    @InjectModel(OrderLine) private readonly lines: typeof OrderLine,
    private readonly listing: ListOrders,
    private readonly own: OwnOrders,
  ) {}

  byId(id: string, tx?: Tx): Promise<OrderRecord | null> {
    return this.orders.findByPk(id, { transaction: tx ?? null });
  }

  /** @throws Refusal `not-found`, alike where there is no such order and where it is not theirs */
  ofBuyer(id: string, person: SignedIn | null, key: string | undefined): Promise<OrderRecord> {
    return this.own.find(id, person, key);
  }

  linesOf(orderId: string, tx?: Tx): Promise<OrderLineRecord[]> {
    return this.lines.findAll({ where: { orderId }, order: [['position', 'ASC']], transaction: tx ?? null });
  }

  /** Newest first. */
  paidOrdersOf(email: string, tx?: Tx): Promise<OrderRecord[]> {
    return this.orders.findAll({
      where: { email, state: 'paid' },
      order: [['paidAt', 'DESC']],
      transaction: tx ?? null,
    });
  }

  /** All orders a query finds, newest first, read in small portions. */
  matching(query: OrderFilter): AsyncGenerator<OrderRecord & { kits: string[] }> {
    return this.listing.all(query);
  }

  /** Days with sales, oldest first; days without are left out. */
  async salesByDay(from: Date): Promise<DaySales[]> {
    const rows = await selectRows<{ day: string; orders: number | string; grossMinor: number | string }>(
      this.database,
      `SELECT DATE_FORMAT(paid_at, '%Y-%m-%d') AS day, COUNT(*) AS orders, SUM(total_minor) AS grossMinor
       FROM orders WHERE paid_at >= :from GROUP BY day ORDER BY day`,
      { from },
    );
    return rows.map((row) => ({
      day: row.day,
      orders: Number(row.orders),
      grossMinor: Number(row.grossMinor),
    }));
  }

  /** What each kit brought in since then, what went back not taken off; the best first. */
  async salesByKit(from: Date, currency: string): Promise<KitSales[]> {
    const rows = await selectRows<{
      kitId: string;
      name: string;
      sold: number | string;
      grossMinor: number | string;
    }>(
      this.database,
      `SELECT l.kit_id AS kitId, MAX(l.kit_name) AS name, COUNT(*) AS sold, SUM(l.total_minor) AS grossMinor
       FROM order_lines l JOIN orders o ON o.id = l.order_id
       WHERE o.paid_at >= :from AND o.currency = :currency
       GROUP BY l.kit_id ORDER BY grossMinor DESC, sold DESC, kitId`,
      { from, currency },
    );
    return rows.map((row) => ({ ...row, sold: Number(row.sold), grossMinor: Number(row.grossMinor) }));
  }

  async countFlagged(): Promise<number> {
    const [row] = await selectRows<{ count: number | string }>(
      this.database,
      'SELECT COUNT(*) AS count FROM orders WHERE JSON_LENGTH(flags) > 0',
    );
    return Number(row?.count ?? 0);
  }
}
