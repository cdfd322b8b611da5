import type Stripe from 'stripe';
import { formatAmount } from '../payments/amounts.js';
import { grouped, sampleCards } from '../payments/cards.js';
import { countries } from './countries.js';
import { layout } from './layout.js';
import { html, type Markup } from './markup.js';
import { orderView } from './order-view.js';
import type { Faults, FormValues } from './payment-form.js';

export type PaymentPage = {
  session: Stripe.Checkout.Session;
  lines: readonly Stripe.LineItem[];
  values: FormValues;
  faults: Faults;
  /** Why the last try failed, if one did. */
  notice: string | null;
};

export function paymentView({ session, lines, values, faults, notice }: PaymentPage): string {
  const isFree = session.amount_total === 0;
  const hasFault = Object.keys(faults).length > 0;
  const message = notice ?? (hasFault ? 'Something is missing or wrong; see the marked fields.' : null);
  const action = isFree
    ? 'Complete the order'
    : `Pay ${formatAmount(session.amount_total ?? 0, session.currency ?? 'eur')}`;
  const content = html`${message && html`<div class="summary" role="alert"><p>${message}</p></div>`}
    <div class="columns">
      ${orderView(session, lines)}
      <form class="sheet" method="post" action="/pay/${session.id}">
        <h2>${isFree ? 'Nothing to pay' : 'Pay by card'}</h2>
        <button class="default-action" name="action" value="pay" tabindex="-1" aria-hidden="true">
          ${action}
        </button>
        ${emailField(session, values, faults)} ${countryField(values, faults)}
        ${!isFree && cardFields(session, values, faults)}
        <div class="actions">
          <button class="main" name="action" value="pay">${action}</button>
          ${
            session.cancel_url &&
            html`<button name="action" value="back" formnovalidate>Go back to the shop</button>`
          }
        </div>
      </form>
    </div>`;
  return layout(`${message ? 'Try again: ' : ''}${isFree ? 'Complete the order' : 'Pay'}`, content);
}

function emailField(session: Stripe.Checkout.Session, values: FormValues, faults: Faults): Markup {
  // An address that the shop has named is fixed, as on the real page.
  const isFixed = Boolean(session.customer_details?.email);
  return html`<div class="field">
    <label for="email">E-mail address</label>
    <input
      id="email"
      name="email"
      type="email"
      autocomplete="email"
      required
      value="${values.email}"
      ${isFixed && html`readonly`}
      ${marks('email', faults)}
    />
    ${faultOf('email', faults)}
  </div>`;
}

function countryField(values: FormValues, faults: Faults): Markup {
  return html`<div class="field">
    <label for="country">Billing country</label>
    <select id="country" name="country" autocomplete="country" required ${marks('country', faults)}>
      <option value="">Choose a country</option>
      ${countries.map(
        ({ code, name }) =>
          html`<option value="${code}" ${code === values.country && html`selected`}>${name}</option>`,
      )}
    </select>
    ${faultOf('country', faults)}
  </div>`;
}

function cardFields(session: Stripe.Checkout.Session, values: FormValues, faults: Faults): Markup {
  return html`<fieldset>
      <legend>Sample cards</legend>
      <p class="hint">Each button fills in the card number below.</p>
      <div class="samples">
        ${sampleCards.map(
          ({ number, label }) =>
            html`<button name="sample" value="${number}" formaction="/pay/${session.id}#card" formnovalidate>
              <span>${label}</span> <span class="number">${grouped(number)}</span>
            </button>`,
        )}
      </div>
    </fieldset>
    <div class="field">
      <label for="card">Card number</label>
      <input
        id="card"
        name="card"
        inputmode="numeric"
        autocomplete="off"
        required
        value="${values.card}"
        ${marks('card', faults)}
      />
      ${faultOf('card', faults)}
    </div>
    <div class="field">
      <label for="name">Name on the card (optional)</label>
      <input id="name" name="name" autocomplete="cc-name" maxlength="150" value="${values.name}" />
    </div>`;
}

function marks(field: keyof Faults, faults: Faults): Markup | false {
  return faults[field] !== undefined && html`aria-invalid="true" aria-describedby="${field}-fault"`;
}

function faultOf(field: keyof Faults, faults: Faults): Markup | false {
  const fault = faults[field];
  return fault !== undefined && html`<p class="fault" id="${field}-fault">${fault}</p>`;
}
