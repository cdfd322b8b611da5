import { badParameter, refused } from '../api/errors.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import { changeSubscription } from '../billing/changes.js';
import { endSubscription } from '../billing/end-subscription.js';
import { periodEnd } from '../billing/run-subscription.js';
import type { StandIn } from '../stand-in.js';
import type { BillingRules } from '../state/records.js';
import { inTimeOf } from '../time/in-time-of.js';
import { laterNames, laterOutcomes, payInvoiceWithoutBrowser } from './buyer-controls.js';
import type { Control } from './control.js';

/** How the service collects, what saved cards do from now on, and what is done to subscriptions by hand. */
export function billingControls(standIn: StandIn): Record<string, Control> {
  return {
    '/billing': (fields) => setBilling(standIn, fields),
    '/payment-methods/:id': (fields, id) => {
      fields.allowOnly('later');
      const card = existing(standIn.state.savedCards, 'payment_method', id);
      card.later = laterOutcomes[fields.requiredOneOf('later', laterNames)];
      return card;
    },
    '/invoices/:id/pay': (fields, id) => {
      const invoice = existing(standIn.state.invoices, 'invoice', id);
      const page = standIn.state.invoicePages.oldestFirst().find(({ invoiceId }) => invoiceId === id);
      if (!page) throw refused(`The invoice ${id} is a draft and has no page yet.`);
      return payInvoiceWithoutBrowser(standIn, invoice, page, fields);
    },
    '/subscriptions/:id/cancel': (fields, id) => {
      fields.allowOnly('at_period_end');
      const subscription = existing(standIn.state.subscriptions, 'subscription', id);
      if (subscription.ended_at !== null) throw refused(`The subscription ${id} has ended already.`);
      const isAtEnd = fields.boolean('at_period_end') ?? false;
      inTimeOf(standIn, subscription.test_clock as string | null, () => {
        if (!isAtEnd) return endSubscription(standIn, subscription, 'cancellation_requested', null);
        changeSubscription(standIn, subscription, null, () => {
          subscription.cancel_at_period_end = true;
          subscription.cancel_at = periodEnd(subscription);
          subscription.canceled_at = standIn.clock.nowSeconds();
        });
      });
      return subscription;
    },
  };
}

/** Sets what is named and leaves the rest. */
function setBilling(standIn: StandIn, fields: Fields): BillingRules {
  fields.allowOnly('retryDays', 'afterRetries', 'finalizeSeconds');
  const { billing } = standIn.state;
  const days = fields.has('retryDays') ? fields.strings('retryDays').map(Number) : billing.retryDays;
  if (days.some((count) => !(count > 0)))
    throw badParameter('retryDays', 'retryDays must be a list of numbers above 0.');
  const finalizeSeconds = fields.integer('finalizeSeconds') ?? billing.finalizeSeconds;
  if (finalizeSeconds < 0) throw badParameter('finalizeSeconds', 'finalizeSeconds must be 0 or more.');
  standIn.state.billing = {
    retryDays: days,
    afterRetries: fields.oneOf('afterRetries', ['cancel', 'mark-unpaid', 'leave']) ?? billing.afterRetries,
    finalizeSeconds,
  };
  return standIn.state.billing;
}
