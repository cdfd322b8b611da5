import type Stripe from 'stripe';
import { laterNames } from '../control/buyer-controls.js';
import { html, type Markup } from '../page/markup.js';
import { layout } from '../page/layout.js';
import { rhythmWords } from '../page/rhythm-words.js';
import { formatAmount, plainAmount } from '../payments/amounts.js';
import { disputeReasons } from '../resources/disputes.js';
import type { StandIn } from '../stand-in.js';

/** As many of each as are shown; the API lists the rest. */
const most = 25;

/** The most common one first. */
const reasons = ['fraudulent', ...disputeReasons.filter((reason) => reason !== 'fraudulent')];

/** Everything that was paid, and what can be done to it on the service's side of things. */
export function deskView(standIn: StandIn, notice: string | null): string {
  const { state } = standIn;
  const paid = state.charges.newestFirst().filter((charge) => charge.paid);
  const content = html`${notice && html`<div class="summary" role="alert"><p>${notice}</p></div>`}
    <p>What is done here is done at the payment service, past the shop. The shop hears of it by events.</p>
    ${timeSection(standIn)}
    ${section('Payments', paid.slice(0, most).map(paymentRow), 'Nothing was paid yet.')}
    ${section('Refunds', state.refunds.newestFirst().slice(0, most).map(refundRow), 'There are no refunds.')}
    ${section('Disputes', state.disputes.newestFirst().slice(0, most).map(disputeRow), 'There are no disputes.')}
    ${section(
      'Subscriptions',
      state.subscriptions.newestFirst().slice(0, most).map(subscriptionRow),
      'There are no subscriptions.',
    )}
    ${section(
      'Invoices to pay',
      state.invoices
        .newestFirst()
        .filter(({ status }) => status === 'open')
        .slice(0, most)
        .map(invoiceRow),
      'No invoice is open.',
    )}`;
  return layout('Desk', content);
}

function section(heading: string, rows: readonly Markup[], empty: string): Markup {
  const id = heading.toLowerCase().replaceAll(' ', '-');
  return html`<section class="sheet desk" aria-labelledby="${id}">
    <h2 id="${id}">${heading}</h2>
    ${
      rows.length > 0
        ? html`<ul>
            ${rows}
          </ul>`
        : html`<p class="hint">${empty}</p>`
    }
  </section>`;
}

const row = (title: string, facts: string, ...forms: (Markup | false)[]): Markup =>
  html`<li>
    <p>
      <strong>${title}</strong><br />
      <span class="hint">${facts}</span>
    </p>
    <div class="forms">${forms}</div>
  </li>`;

/** One form: a button, with what has to be said before. */
const form = (action: string, id: string, button: string, field: Markup | null = null): Markup =>
  html`<form method="post" action="/desk">
    <input type="hidden" name="id" value="${id}" />
    ${field}
    <button name="action" value="${action}">${button}</button>
  </form>`;

function choice(name: string, label: string, options: readonly string[]): Markup {
  return html`<select name="${name}" aria-label="${label}">
    ${options.map((option) => html`<option>${option}</option>`)}
  </select>`;
}

function timeSection(standIn: StandIn): Markup {
  const now = new Date(standIn.clock.flowingMs()).toISOString().slice(0, 16).replace('T', ' ');
  const field = html`<input name="days" inputmode="numeric" value="31" aria-label="Days" />`;
  const title = `${now} UTC`;
  const isMoved = standIn.clock.offsetMs !== 0;
  return section(
    'Time',
    [
      row(
        title,
        isMoved ? 'Moved on. What has happened stays when the real time comes back.' : 'The real time.',
        form('time', '', 'Move on by these days', field),
        isMoved && form('real-time', '', 'Back to the real time'),
      ),
    ],
    '',
  );
}

function paymentRow(charge: Stripe.Charge): Markup {
  const left = charge.amount_captured - charge.amount_refunded;
  const amount = html`<input
    name="amount"
    inputmode="decimal"
    value="${plainAmount(left, charge.currency)}"
    aria-label="Amount to give back"
  />`;
  const facts = [
    charge.billing_details.email,
    charge.description,
    charge.amount_refunded > 0 && `${formatAmount(charge.amount_refunded, charge.currency)} given back`,
    charge.disputed && 'disputed',
    String(charge.payment_intent),
  ];
  return row(
    `${formatAmount(charge.amount, charge.currency)} on ${dayOf(charge.created)}`,
    facts.filter(Boolean).join(' · '),
    left > 0 && !charge.disputed && form('refund', charge.id, 'Give back', amount),
    left > 0 &&
      !charge.disputed &&
      form('dispute', charge.id, 'Open a dispute', choice('reason', 'Reason', reasons)),
  );
}

function refundRow(refund: Stripe.Refund): Markup {
  return row(
    `${formatAmount(refund.amount, refund.currency)}, ${refund.status}`,
    `${dayOf(refund.created)} · ${String(refund.payment_intent)}`,
    refund.status === 'pending' && form('refund-succeeds', refund.id, 'Goes through'),
    (refund.status === 'pending' || refund.status === 'succeeded') &&
      form('refund-fails', refund.id, 'The bank sends it back'),
  );
}

function disputeRow(dispute: Stripe.Dispute): Markup {
  const isOpen = !['won', 'lost', 'warning_closed'].includes(dispute.status);
  return row(
    `${formatAmount(dispute.amount, dispute.currency)}, ${dispute.status}`,
    `${dispute.reason} · answer by ${dayOf(dispute.evidence_details.due_by ?? 0)} · ${String(dispute.payment_intent)}`,
    isOpen && form('dispute-won', dispute.id, 'The shop wins'),
    isOpen && form('dispute-lost', dispute.id, 'The shop loses'),
  );
}

function subscriptionRow(subscription: Stripe.Subscription): Markup {
  const item = subscription.items.data[0];
  const method = subscription.default_payment_method;
  const rhythm = item?.price.recurring ? rhythmWords(item.price.recurring) : '';
  const isRunning = subscription.ended_at === null;
  return row(
    `${formatAmount(item?.price.unit_amount ?? 0, subscription.currency)} ${rhythm}, ${subscription.status}`,
    `${subscription.description ?? ''} · until ${dayOf(item?.current_period_end ?? 0)} · ${subscription.id}`,
    isRunning &&
      typeof method === 'string' &&
      form(
        'card',
        method,
        'The card does this from now on',
        choice('later', 'When it is charged', laterNames),
      ),
    isRunning && form('end', subscription.id, 'End it now'),
  );
}

function invoiceRow(invoice: Stripe.Invoice): Markup {
  const next = invoice.next_payment_attempt;
  return row(
    `${formatAmount(invoice.amount_remaining, invoice.currency)}, ${invoice.number ?? ''}`,
    next === null ? 'Not tried again by itself.' : `Tried again on ${dayOf(next)}.`,
    html`<a href="${invoice.hosted_invoice_url ?? ''}">Its page</a>`,
  );
}

const dayOf = (seconds: number): string =>
  new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeZone: 'UTC' }).format(seconds * 1000);
