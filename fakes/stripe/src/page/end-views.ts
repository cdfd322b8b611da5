import { layout } from './layout.js';
import { html } from './markup.js';

/** The bank's question between pressing the button and the charge. `what` goes on from "do you approve". */
export function secondStepView(path: string, what: string): string {
  return layout(
    'Second step',
    html`<form class="sheet narrow" method="post" action="${path}">
      <h2>Your bank asks: do you approve ${what}?</h2>
      <p>A real bank would ask in its own app, or for a code. Here you choose how it ends.</p>
      <div class="actions">
        <button class="main" name="answer" value="approve">Approve</button>
        <button name="answer" value="refuse">Refuse</button>
      </div>
    </form>`,
  );
}

/** Nothing is left to do. */
export function doneView(heading: string, shopAddress: string | null): string {
  return layout(
    'Already done',
    html`<div class="sheet narrow">
      <h2>${heading}</h2>
      <p>Nothing is left to do on this page.</p>
      ${shopAddress && html`<p><a href="${shopAddress}">Go back to the shop</a></p>`}
    </div>`,
  );
}

export function expiredView(shopAddress: string | null): string {
  return layout(
    'Expired',
    html`<div class="sheet narrow">
      <h2>The time to pay on this page is over</h2>
      <p>Nothing was paid. Start again from the shop.</p>
      ${shopAddress && html`<p><a href="${shopAddress}">Go back to the shop</a></p>`}
    </div>`,
  );
}

export function unknownView(): string {
  return layout(
    'Not found',
    html`<div class="sheet narrow">
      <h2>There is no such payment page</h2>
      <p>The address is wrong, or the stand-in was started afresh since. Start again from the shop.</p>
    </div>`,
  );
}
