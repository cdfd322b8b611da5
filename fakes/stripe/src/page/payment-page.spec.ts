import { Shop } from '../testing/shop.js';

const filled = {
  action: 'pay',
  email: 'ada@example.test',
  country: 'FR',
  card: '4242 4242 4242 4242',
  name: 'Ada',
};

describe('the payment page', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  it('says what it is, what is bought and what it costs', async () => {
    const session = await shop.openSession();
    const response = await fetch(String(session.url));
    const page = await response.text();
    expect(page).toContain('No money moves.');
    expect(page).toContain('Reed pipes, Mk 2.3');
    expect(page).toContain('Pay €33.00');
    expect(response.headers.get('content-security-policy')).toContain("default-src 'none'");
    expect(page).not.toMatch(/<script|style=/);
  });

  it('escapes what the shop sends', async () => {
    const session = await shop.openSession({ customer_email: '"><b>@example.test' });
    const page = await (await fetch(String(session.url))).text();
    expect(page).toContain('&#34;&#62;&#60;b&#62;@example.test');
    expect(page).not.toContain('<b>');
  });

  it('pays and sends the buyer back to the shop with the session id', async () => {
    const session = await shop.openSession();
    const answer = await shop.postForm(`/pay/${session.id}`, filled);
    expect(answer).toMatchObject({ status: 303, to: `http://shop.test/thanks?session=${session.id}` });
    const paid = await shop.stripe.checkout.sessions.retrieve(session.id);
    expect(paid.customer_details).toMatchObject({
      email: 'ada@example.test',
      name: 'Ada',
      address: { country: 'FR' },
    });
    const again = await fetch(`${shop.standIn.url}/pay/${session.id}`);
    expect(await again.text()).toContain('This order is complete');
  });

  it('takes the money once when "Pay" is sent twice', async () => {
    const session = await shop.openSession();
    await Promise.all([
      shop.postForm(`/pay/${session.id}`, filled),
      shop.postForm(`/pay/${session.id}`, filled),
    ]);
    expect((await shop.stripe.charges.list()).data).toHaveLength(1);
  });

  it('tells of a declined card, keeps the rest of the form and lets the buyer try another', async () => {
    const session = await shop.openSession();
    const declined = await shop.postForm(`/pay/${session.id}`, { ...filled, card: '4000000000000002' });
    expect(declined.to).toBeNull();
    expect(declined.page).toContain('Your card was declined.');
    expect(declined.page).toContain('value="ada@example.test"');
    expect(declined.page).toMatch(/value="FR" selected/);
    const open = await shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['payment_intent'] });
    expect(open.status).toBe('open');
    expect(open.payment_intent).toMatchObject({
      status: 'requires_payment_method',
      last_payment_error: { type: 'card_error', code: 'card_declined', decline_code: 'generic_decline' },
    });
    await shop.postForm(`/pay/${session.id}`, filled);
    await shop.control('/webhooks/flush');
    expect(shop.types()).toEqual([
      'payment_intent.created',
      'charge.failed',
      'payment_intent.payment_failed',
      'charge.succeeded',
      'payment_intent.succeeded',
      'checkout.session.completed',
    ]);
    const charges = await shop.stripe.charges.list({
      payment_intent: String((open.payment_intent as { id: string }).id),
    });
    expect(charges.data.map(({ status }) => status)).toEqual(['succeeded', 'failed']);
  });

  it('asks the bank for a second step and charges once it is approved', async () => {
    const session = await shop.openSession();
    const asked = await shop.postForm(`/pay/${session.id}`, { ...filled, card: '4000002500003155' });
    expect(asked.to).toBe(`/pay/${session.id}/second-step`);
    const waiting = await shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['payment_intent'] });
    expect(waiting.payment_intent).toMatchObject({
      status: 'requires_action',
      next_action: { type: 'redirect_to_url', redirect_to_url: { url: shop.standIn.url + String(asked.to) } },
    });
    expect((await shop.stripe.charges.list()).data).toEqual([]);
    const done = await shop.postForm(String(asked.to), { answer: 'approve' });
    expect(done.to).toBe(`http://shop.test/thanks?session=${session.id}`);
    const charge = (await shop.stripe.charges.list()).data[0];
    expect(charge?.payment_method_details?.card).toMatchObject({
      country: 'FR',
      three_d_secure: { result: 'authenticated' },
    });
  });

  it('goes back to the form when the second step is refused', async () => {
    const session = await shop.openSession();
    const asked = await shop.postForm(`/pay/${session.id}`, { ...filled, card: '4000002500003155' });
    const refused = await shop.postForm(String(asked.to), { answer: 'refuse' });
    expect(refused.page).toContain('The second step was refused.');
    const open = await shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['payment_intent'] });
    expect(open.payment_intent).toMatchObject({
      status: 'requires_payment_method',
      last_payment_error: { code: 'payment_intent_authentication_failure' },
    });
    expect((await shop.postForm(`/pay/${session.id}`, filled)).status).toBe(303);
  });

  it.each([
    [{ email: 'ada' }, 'Enter an e-mail address'],
    [{ country: '' }, 'Choose the country'],
    [{ country: 'XX' }, 'Choose the country'],
    [{ card: '4242 4242 4242 4243' }, 'a digit is wrong or missing'],
    [{ card: '4111 1111 1111 1111' }, 'takes test cards alone'],
  ])('marks the field that is wrong: %j', async (wrong, sentence) => {
    const session = await shop.openSession();
    const answer = await shop.postForm(`/pay/${session.id}`, { ...filled, ...wrong });
    expect(answer.status).toBe(200);
    expect(answer.page).toContain(sentence);
    expect(answer.page).toContain('aria-invalid="true"');
    expect((await shop.stripe.checkout.sessions.retrieve(session.id)).payment_intent).toBeNull();
  });

  it('fills in a sample card without losing what was typed', async () => {
    const session = await shop.openSession();
    const answer = await shop.postForm(`/pay/${session.id}`, {
      email: 'ada@example.test',
      country: 'FR',
      sample: '4000000000000002',
    });
    expect(answer.page).toContain('value="4000 0000 0000 0002"');
    expect(answer.page).toContain('value="ada@example.test"');
  });

  it('goes back to the shop, address and query whole, and leaves the session open', async () => {
    const session = await shop.openSession();
    const answer = await shop.postForm(`/pay/${session.id}`, { action: 'back' });
    expect(answer).toMatchObject({ status: 303, to: 'http://shop.test/basket?step=2' });
    expect((await shop.stripe.checkout.sessions.retrieve(session.id)).status).toBe('open');
  });

  it('keeps the e-mail address that the shop has set', async () => {
    const session = await shop.openSession({ customer_email: 'fixed@example.test' });
    await shop.postForm(`/pay/${session.id}`, { ...filled, email: 'other@example.test' });
    const paid = await shop.stripe.checkout.sessions.retrieve(session.id);
    expect(paid.customer_details?.email).toBe('fixed@example.test');
  });

  it('says so where there is no such page', async () => {
    const response = await fetch(`${shop.standIn.url}/pay/cs_test_nothing`);
    expect(response.status).toBe(404);
    expect(await response.text()).toContain('There is no such payment page');
  });
});
