import { Injectable } from '@nestjs/common';
import type { Handled } from '@windchest/contracts';
import { decimalText } from '@windchest/money';
import { Supporters } from '../supporters/supporters.js';
import { csvRecord } from '../http/csv.js';

const HEAD = [
  'name',
  'email',
  'plan',
  'state',
  'currency',
  'amount_each_month',
  'paid_in_all',
  'country',
  'began_at',
  'next_payment_at',
  'ends_at',
  'ended_at',
  'flags',
];

/** All supporters a search finds, as CSV, row by row as they are read. */
@Injectable()
export class ExportSupporters {
  constructor(private readonly supporters: Supporters) {}

  async *lines(query: Handled<'GET /workshop/supporters.csv'>['query']): AsyncGenerator<string> {
    yield csvRecord(HEAD);
    for await (const one of this.supporters.matching(query))
      yield csvRecord([
        one.name,
        one.email,
        one.plan.name,
        one.state,
        one.amount.currency,
        decimalText(one.amount),
        decimalText(one.paid),
        one.country,
        one.beganAt,
        one.nextPaymentAt,
        one.endsAt,
        one.endedAt,
        one.flags.join('; '),
      ]);
  }
}
