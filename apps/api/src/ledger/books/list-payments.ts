import { Injectable } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { decimalText } from '@windchest/money';
import { csvNumber, csvRecord } from '../../http/csv.js';
import { Movements, type Movement, type MovementFilter, type MovementKind } from './movements.js';

type Query = Handled<'GET /workshop/ledger/payments'>['query'];
type Row = Answer<'GET /workshop/ledger/payments'>['items'][number];

const dayMs = 86_400_000;
const HEAD = [
  'kind',
  'at',
  'amount',
  'currency',
  'state',
  'subject',
  'email',
  'payment_reference',
  'refund_or_dispute_reference',
];

/** What a filter of the page means of the books' kinds: money that comes back belongs to what took it. */
const kindsOf: Record<NonNullable<Query['kind']>, readonly MovementKind[]> = {
  payment: ['payment'],
  refund: ['refund', 'refund-back'],
  dispute: ['dispute', 'dispute-back'],
  pledge: ['pledge'],
};
const shownKind: Record<MovementKind, Row['kind']> = {
  payment: 'payment',
  refund: 'refund',
  'refund-back': 'refund',
  dispute: 'dispute',
  'dispute-back': 'dispute',
  pledge: 'pledge',
};

/** Payments, refunds, disputes and pledges in one list. */
@Injectable()
export class ListPayments {
  constructor(private readonly movements: Movements) {}

  async page(query: Query): Promise<Answer<'GET /workshop/ledger/payments'>> {
    const { items, total } = await this.movements.page(filterOf(query), query);
    return { items: items.map(toRow), page: query.page, size: query.size, total };
  }

  async *lines(query: Query): AsyncGenerator<string> {
    yield csvRecord(HEAD);
    for await (const one of this.movements.all(filterOf(query)))
      yield csvRecord([
        one.kind,
        one.at.toISOString(),
        csvNumber(decimalText({ minor: one.amountMinor, currency: one.currency })),
        one.currency,
        one.state,
        one.subject,
        one.email,
        one.intentId,
        one.serviceId,
      ]);
  }
}

const filterOf = ({ kind, from, to, search }: Query): MovementFilter => ({
  kinds: kind && kindsOf[kind],
  from: from ? new Date(from) : undefined,
  until: to ? new Date(Date.parse(to) + dayMs) : undefined,
  search,
});

const toRow = (one: Movement): Row => ({
  id: one.id,
  kind: shownKind[one.kind],
  at: one.at.toISOString(),
  amount: { minor: one.amountMinor, currency: one.currency },
  state: one.kind === 'refund-back' || one.kind === 'dispute-back' ? 'came-back' : one.state,
  orderId: one.orderId,
  subject: one.subject,
  email: one.email,
  reference: one.serviceId ?? one.intentId,
});
