import type Stripe from 'stripe';
import { formatAmount } from '../payments/amounts.js';
import { html, type Markup } from './markup.js';
import { rhythmWords } from './rhythm-words.js';

type Row = { name: string; quantity: number; amountMinor: number };

/** The table of what costs what. */
function amounts(rows: readonly Row[], total: number, currency: string, totalName: string): Markup {
  const money = (minor: number) => formatAmount(minor, currency);
  return html`<table>
    <thead>
      <tr>
        <th scope="col">Item</th>
        <th scope="col" class="amount">Amount</th>
      </tr>
    </thead>
    <tbody>
      ${rows.map(
        ({ name, quantity, amountMinor }) =>
          html`<tr>
            <th scope="row">${name}${quantity > 1 && html` <span class="number">× ${quantity}</span>`}</th>
            <td class="amount">${money(amountMinor)}</td>
          </tr>`,
      )}
    </tbody>
    <tfoot>
      <tr>
        <th scope="row">${totalName}</th>
        <td class="amount">${money(total)}</td>
      </tr>
    </tfoot>
  </table>`;
}

export function orderView(session: Stripe.Checkout.Session, lines: readonly Stripe.LineItem[]): Markup {
  const rows = lines.map((line) => ({
    name: line.description ?? 'Item',
    quantity: line.quantity ?? 1,
    amountMinor: line.amount_total,
  }));
  const total = session.amount_total ?? 0;
  const currency = session.currency ?? 'eur';
  const recurring = lines[0]?.price?.recurring;
  if (session.mode === 'setup') return cardSection();
  if (!recurring) return section('What is to be paid', amounts(rows, total, currency, 'Total'));
  const money = formatAmount(total, currency);
  const rhythm = rhythmWords(recurring);
  return section(
    `What is to be paid ${rhythm}`,
    html`${amounts(rows, total, currency, `Total ${rhythm}`)}
      <p class="below">
        ${money} is taken today, and ${money} ${rhythm} from then on by the same card, until it is ended at
        the shop.
      </p>`,
  );
}

export function invoiceView(invoice: Stripe.Invoice): Markup {
  const day = new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: 'UTC' });
  const dayOf = (seconds: number) => day.format(seconds * 1000);
  const rows = invoice.lines.data.map((line) => ({
    name: `${line.description ?? 'Item'}, ${dayOf(line.period.start)} to ${dayOf(line.period.end)}`,
    quantity: 1,
    amountMinor: line.amount,
  }));
  return section(
    `Invoice ${invoice.number ?? ''}`,
    amounts(rows, invoice.amount_remaining, invoice.currency, 'To be paid'),
  );
}

function cardSection(): Markup {
  return section(
    'A card for later',
    html`<p>
      Nothing is taken now. The card is kept for what falls due later, in place of the one before it.
    </p>`,
  );
}

const section = (heading: string, content: Markup): Markup =>
  html`<section class="sheet" aria-labelledby="order">
    <h2 id="order">${heading}</h2>
    ${content}
  </section>`;
