import { Injectable } from '@nestjs/common';
import type { Handled } from '@windchest/contracts';
import { decimalText } from '@windchest/money';
import { OrdersReader } from '../orders/orders-reader.js';
import { csvRecord } from '../http/csv.js';

const HEAD = [
  'number',
  'state',
  'placed_at',
  'paid_at',
  'email',
  'declared_country',
  'billing_country',
  'card_country',
  'kits',
  'currency',
  'subtotal',
  'discount',
  'total',
  'refunded',
  'coupon',
  'receipt',
  'flags',
];

/** All orders a search finds, as CSV, row by row as they are read. */
@Injectable()
export class ExportOrders {
  constructor(private readonly orders: OrdersReader) {}

  async *lines(query: Handled<'GET /workshop/orders.csv'>['query']): AsyncGenerator<string> {
    yield csvRecord(HEAD);
    for await (const order of this.orders.matching(query)) {
      const amount = (minor: number): string => decimalText({ minor, currency: order.currency });
      yield csvRecord([
        order.number,
        order.state,
        order.createdAt.toISOString(),
        order.paidAt?.toISOString() ?? null,
        order.email,
        order.declaredCountry,
        order.paymentCountry,
        order.cardCountry,
        order.kits.join('; '),
        order.currency,
        amount(order.subtotalMinor),
        amount(order.discountMinor),
        amount(order.totalMinor),
        amount(order.refundedMinor),
        order.couponCode,
        order.receiptNumber,
        order.flags.join('; '),
      ]);
    }
  }
}
