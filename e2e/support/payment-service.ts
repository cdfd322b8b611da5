const stripeUrl = process.env['WINDCHEST_STRIPE_URL'] ?? '';
const key = process.env['WINDCHEST_STRIPE_KEY'] ?? '';

const control = async (path: string, body: object): Promise<void> => {
  const answer = await fetch(`${stripeUrl}/control${path}`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
  });
  if (!answer.ok) throw new Error(`The payment stand-in answered ${answer.status}: ${await answer.text()}`);
};

/** Time goes by at the payment service: months begin, and are paid or not; the shop hears of it. */
export const daysGoBy = async (days: number): Promise<void> => {
  await control('/clock', { advanceSeconds: days * 86_400 });
  await control('/webhooks/flush', {});
};

/** How the service collects; what is not named stays. */
export const setBilling = (rules: { retryDays?: number[]; afterRetries?: 'cancel' }): Promise<void> =>
  control('/billing', rules);

/** The cards of a customer of the service fail from now on. */
export const cardsWillFail = async (customerId: string): Promise<void> => {
  const answer = await fetch(`${stripeUrl}/v1/customers/${customerId}/payment_methods`, {
    headers: { authorization: `Bearer ${key}` },
  });
  const { data } = (await answer.json()) as { data: { id: string }[] };
  for (const { id } of data) await control(`/payment-methods/${id}`, { later: 'decline' });
};

/** The service’s clock is everybody’s again. */
export const backToNow = async (): Promise<void> => {
  await control('/billing', { retryDays: [3, 5, 7], afterRetries: 'cancel' });
  await control('/clock', { real: true });
};
