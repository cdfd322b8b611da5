import type Stripe from 'stripe';
import { formatAmount } from '../payments/amounts.js';
import { html, type Markup } from './markup.js';

export function orderView(session: Stripe.Checkout.Session, lines: readonly Stripe.LineItem[]): Markup {
  const money = (minor: number) => formatAmount(minor, session.currency ?? 'eur');
  return html`<section class="sheet" aria-labelledby="order">
    <h2 id="order">What is to be paid</h2>
    <table>
      <thead>
        <tr>
          <th scope="col">Item</th>
          <th scope="col" class="amount">Amount</th>
        </tr>
      </thead>
      <tbody>
        ${lines.map(
          (line) =>
            html`<tr>
              <th scope="row">
                ${line.description ?? 'Item'}${
                  (line.quantity ?? 1) > 1 && html` <span class="number">× ${line.quantity}</span>`
                }
              </th>
              <td class="amount">${money(line.amount_total)}</td>
            </tr>`,
        )}
      </tbody>
      <tfoot>
        <tr>
          <th scope="row">Total</th>
          <td class="amount">${money(session.amount_total ?? 0)}</td>
        </tr>
      </tfoot>
    </table>
  </section>`;
}
