import { randomUUID } from 'node:crypto';
import type { Handled, Pledge, WorkshopPlan } from '@windchest/contracts';
import { sessionIdOf, type PaymentShop } from './payment-shop.js';
import { signInAs } from './sign-in.js';
import type { Browser } from './test-app.js';

type PlanBody = Handled<'POST /workshop/plans'>['body'];

export const planBody = (changes: Partial<PlanBody> = {}): PlanBody => ({
  name: `Tide table ${randomUUID().slice(0, 8)}`,
  words: 'Two kits, and what becomes of them.',
  amountMinor: 900,
  hasAllKits: false,
  kitIds: [],
  keepsAfter: 'released-during',
  isOffered: true,
  ...changes,
});

/** A plan made by a maker of the workshop. */
export const makePlan = async (shop: PaymentShop, changes: Partial<PlanBody>): Promise<WorkshopPlan> => {
  const maker = await signInAs(shop, 'maker');
  const answer = await maker.post('/api/workshop/plans').send(planBody(changes)).expect(201);
  return answer.body as WorkshopPlan;
};

export const pledgeBody = (planId: string, changes: object = {}) => ({
  planId,
  country: 'DE',
  hasConsented: true,
  attempt: randomUUID(),
  ...changes,
});

/** What a card does when it is charged later, for `pledgeAs` and `answerOf`. */
export type Later = 'succeed' | 'decline';

/** Opens the page of a pledge and pays there as its visitor does; nothing is delivered yet. */
export const pledgeAs = async (
  shop: PaymentShop,
  browser: Browser,
  planId: string,
  { later = 'succeed', country = 'DE' }: { later?: Later; country?: string } = {},
): Promise<string> => {
  const opened = await browser.post('/api/pledges').send(pledgeBody(planId, { country })).expect(201);
  const { pledgeId, paymentUrl } = opened.body as { pledgeId: string; paymentUrl: string };
  await shop.control(`/sessions/${sessionIdOf(paymentUrl)}/pay`, { country, cardCountry: country, later });
  return pledgeId;
};

export const readPledge = async (browser: Browser, pledgeId: string): Promise<Pledge> =>
  (await browser.get(`/api/pledges/${pledgeId}`).expect(200)).body as Pledge;

/** All that the payment service has to say arrives and is worked on. */
export const hearAll = async (shop: PaymentShop): Promise<void> => {
  await shop.control('/webhooks/flush');
  await shop.drain();
};

/** Days go by here and at the payment service, in steps: after each, all that fell due is heard and done. */
export const daysGoBy = async (shop: PaymentShop, ...steps: readonly number[]): Promise<void> => {
  for (const days of steps) {
    const seconds = Math.round(days * 86_400);
    shop.clock.advance(seconds);
    await shop.control('/clock', { advanceSeconds: seconds });
    await hearAll(shop);
  }
};

/** The card behind a pledge fails from now on, or works again. */
export const cardWill = async (shop: PaymentShop, pledgeId: string, later: Later): Promise<void> => {
  const keys = { authorization: `Bearer ${shop.stripe.apiKey}` };
  const read = async <T>(path: string): Promise<T> =>
    (await (await fetch(`${shop.stripe.url}/v1${path}`, { headers: keys })).json()) as T;
  const [row] = (await shop.database.query('SELECT customer_id FROM pledges WHERE id = ?', {
    replacements: [pledgeId],
  })) as [{ customer_id: string }[], unknown];
  const { data } = await read<{ data: { id: string }[] }>(
    `/customers/${row[0]?.customer_id}/payment_methods`,
  );
  for (const { id } of data) await shop.control(`/payment-methods/${id}`, { later });
};
