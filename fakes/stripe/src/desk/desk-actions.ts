import type { Fields } from '../api/fields.js';
import { fieldsOf } from '../control/control-fields.js';
import { billingControls } from '../control/billing-controls.js';
import { moveClock } from '../control/clock-and-summary.js';
import type { Control } from '../control/control.js';
import { moneyBackControls } from '../control/money-back-controls.js';
import { parseAmount } from '../payments/amounts.js';
import type { StandIn } from '../stand-in.js';
import { badParameter } from '../api/errors.js';

type Posted = Record<string, string | undefined>;

/** What the desk's buttons do: each is one of the control API's switches, with what was typed turned into its words. */
export function deskAction(standIn: StandIn, name: string, posted: Posted): object | Promise<object> | void {
  const controls = { ...moneyBackControls(standIn), ...billingControls(standIn) };
  const id = posted.id ?? '';
  const run = (path: string, body: object, on = id) => (controls[path] as Control)(fieldsOf(body), on);
  switch (name) {
    case 'refund':
      return run('/refunds', { charge: id, amount: amountOf(standIn, id, posted.amount ?? '') });
    case 'refund-succeeds':
      return run('/refunds/:id/settle', { status: 'succeeded' });
    case 'refund-fails':
      return run('/refunds/:id/settle', { status: 'failed' });
    case 'dispute':
      return run('/disputes', { payment_intent: intentOf(standIn, id), reason: posted.reason });
    case 'dispute-won':
      return run('/disputes/:id/close', { status: 'won' });
    case 'dispute-lost':
      return run('/disputes/:id/close', { status: 'lost' });
    case 'card':
      return run('/payment-methods/:id', { later: posted.later });
    case 'end':
      return run('/subscriptions/:id/cancel', {});
    case 'time':
      return moveClock(standIn, daysOf(posted.days ?? ''));
    case 'real-time':
      return moveClock(standIn, fieldsOf({ real: true }));
    default:
      throw badParameter('action', 'There is no such button.');
  }
}

function amountOf(standIn: StandIn, chargeId: string, typed: string): number {
  const currency = standIn.state.charges.find(chargeId)?.currency ?? 'eur';
  const amount = parseAmount(typed, currency);
  if (!amount) throw badParameter('amount', `"${typed}" is not an amount. Type it as 12.50.`);
  return amount;
}

const intentOf = (standIn: StandIn, chargeId: string): string =>
  String(standIn.state.charges.find(chargeId)?.payment_intent);

function daysOf(typed: string): Fields {
  if (!/^\d{1,4}$/.test(typed) || Number(typed) < 1)
    throw badParameter('days', `"${typed}" is not a number of days.`);
  return fieldsOf({ advanceSeconds: Number(typed) * 86_400 });
}
