import { grouped } from '../payments/cards.js';
import { countries } from './countries.js';
import { layout } from './layout.js';
import { html, type Markup } from './markup.js';
import type { Faults, FormShape, FormValues } from './payment-form.js';

export type PaymentPage = {
  /** Where the form goes. */
  path: string;
  title: string;
  heading: string;
  /** The main button. */
  action: string;
  /** What it is about, beside the form. */
  summary: Markup;
  shape: FormShape;
  samples: readonly { number: string; label: string }[];
  canGoBack: boolean;
  values: FormValues;
  faults: Faults;
  /** Why the last try failed, if one did. */
  notice: string | null;
};

export function paymentView(page: PaymentPage): string {
  const { faults, notice, path, action } = page;
  const hasFault = Object.keys(faults).length > 0;
  const message = notice ?? (hasFault ? 'Something is missing or wrong; see the marked fields.' : null);
  const content = html`${message && html`<div class="summary" role="alert"><p>${message}</p></div>`}
    <div class="columns">
      ${page.summary}
      <form class="sheet" method="post" action="${path}">
        <h2>${page.heading}</h2>
        <button class="default-action" name="action" value="pay" tabindex="-1" aria-hidden="true">
          ${action}
        </button>
        ${emailField(page)} ${countryField(page)} ${page.shape.isCardNeeded && cardFields(page)}
        <div class="actions">
          <button class="main" name="action" value="pay">${action}</button>
          ${
            page.canGoBack &&
            html`<button name="action" value="back" formnovalidate>Go back to the shop</button>`
          }
        </div>
      </form>
    </div>`;
  return layout(`${message ? 'Try again: ' : ''}${page.title}`, content);
}

function emailField({ shape, values, faults }: PaymentPage): Markup {
  // An address that the shop has named is fixed, as on the real page.
  return html`<div class="field">
    <label for="email">E-mail address</label>
    <input
      id="email"
      name="email"
      type="email"
      autocomplete="email"
      required
      value="${values.email}"
      ${shape.fixedEmail !== null && html`readonly`}
      ${marks('email', faults)}
    />
    ${faultOf('email', faults)}
  </div>`;
}

function countryField({ values, faults }: PaymentPage): Markup {
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

function cardFields({ path, samples, values, faults }: PaymentPage): Markup {
  return html`<fieldset>
      <legend>Sample cards</legend>
      <p class="hint">Each button fills in the card number below.</p>
      <div class="samples">
        ${samples.map(
          ({ number, label }) =>
            html`<button name="sample" value="${number}" formaction="${path}#card" formnovalidate>
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
