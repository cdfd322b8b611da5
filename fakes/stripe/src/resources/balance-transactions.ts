import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { StandIn } from '../stand-in.js';

/** What the stand-in keeps of each charge: 1.5 % and 25 minor units. Made up; refunds do not give it back. */
export const chargeFeeMinor = (amount: number): number => Math.round(amount * 0.015) + 25;
/** What a dispute costs, won or lost. Made up as well. */
export const disputeFeeMinor = 2000;

export type Movement = {
  type: 'charge' | 'refund' | 'refund_failure' | 'adjustment';
  category: 'charge' | 'refund' | 'refund_failure' | 'dispute' | 'dispute_reversal';
  /** Money that leaves has a minus sign. */
  amount: number;
  fee: number;
  currency: string;
  source: string;
  description: string | null;
};

/** Writes down that money moved. It is available at once: the stand-in pays nothing out. */
export function book(standIn: StandIn, movement: Movement): Stripe.BalanceTransaction {
  const now = standIn.clock.nowSeconds();
  const { amount, fee, currency } = movement;
  const transaction: Stripe.BalanceTransaction = {
    id: standIn.newId('txn'),
    object: 'balance_transaction',
    amount,
    available_on: now,
    balance_type: 'payments',
    created: now,
    currency,
    description: movement.description,
    exchange_rate: null,
    fee,
    fee_details: fee
      ? [{ amount: fee, application: null, currency, description: 'Fee of the stand-in', type: 'stripe_fee' }]
      : [],
    net: amount - fee,
    reporting_category: movement.category,
    source: movement.source,
    status: 'available',
    type: movement.type,
  };
  return standIn.state.balanceTransactions.add(transaction);
}

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'created', 'currency', 'source', 'type');
  const currency = call.fields.currency('currency');
  const source = call.fields.string('source');
  const type = call.fields.string('type');
  const transactions = call.standIn.state.balanceTransactions
    .newestFirst()
    .filter((one) => currency === null || one.currency === currency)
    .filter((one) => source === null || one.source === source)
    .filter((one) => type === null || one.type === type)
    .filter(createdFilter(call.fields));
  return pageOf(call, transactions);
}

export const balanceTransactionRoutes: ApiRoute[] = [
  { method: 'get', path: '/v1/balance_transactions', run: listFromCall },
  {
    method: 'get',
    path: '/v1/balance_transactions/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.balanceTransactions, 'balance_transaction', id);
    },
  },
];
