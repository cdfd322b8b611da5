import { factsOf } from './payment-event-facts.js';

const orderId = '01a3b5c7-0000-7000-8000-000000000001';

describe('what an event is about', () => {
  it('is a page of an order, by the reference the shop gave it', () => {
    expect(
      factsOf('checkout.session.completed', 'cs_1', { client_reference_id: orderId, payment_intent: 'pi_1' }),
    ).toMatchObject({ kind: 'page', orderId, sessionId: 'cs_1', paymentIntentId: 'pi_1', flag: null });
    expect(factsOf('payment_intent.succeeded', 'pi_1', { metadata: { order: orderId } })).toMatchObject({
      kind: 'page',
      orderId,
      sessionId: null,
      paymentIntentId: 'pi_1',
    });
  });

  it('is money that goes back, with a sentence for the history', () => {
    expect(
      factsOf('charge.refunded', 'ch_1', {
        payment_intent: { id: 'pi_1' },
        amount: 900,
        amount_refunded: 400,
        currency: 'eur',
        metadata: {},
      }),
    ).toMatchObject({
      kind: 'money-back',
      flag: 'refunded-outside',
      orderId: null,
      paymentIntentId: 'pi_1',
      text: '400 minor units of EUR',
    });
    expect(
      factsOf('charge.dispute.closed', 'dp_1', {
        payment_intent: 'pi_1',
        amount: 900,
        currency: 'eur',
        reason: 'fraudulent',
        status: 'lost',
      }),
    ).toMatchObject({ flag: 'disputed', text: '900 minor units of EUR, reason fraudulent, now lost' });
  });

  it('is nothing of ours for other kinds, other references and odd payloads', () => {
    expect(factsOf('customer.created', 'cus_1', {}).kind).toBe('other');
    expect(factsOf('checkout.session.expired', 'cs_1', { client_reference_id: '17' }).orderId).toBeNull();
    expect(factsOf('charge.refunded', 'ch_1', { amount: 'much' })).toMatchObject({ orderId: null, text: '' });
  });

  it('is read alike from a column that comes as text', () => {
    const payload = { client_reference_id: orderId };
    expect(factsOf('checkout.session.expired', 'cs_1', JSON.stringify(payload))).toEqual(
      factsOf('checkout.session.expired', 'cs_1', payload),
    );
  });
});
