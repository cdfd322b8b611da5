import { readPaymentEvent } from './payment-event.js';

describe('what a payment event names', () => {
  it('tells pages of orders, pledges and cards apart', () => {
    const page = (mode: string) =>
      readPaymentEvent('checkout.session.completed', 'cs_1', {
        mode,
        client_reference_id: 'ref-1',
        subscription: mode === 'subscription' ? 'sub_1' : null,
        metadata: mode === 'setup' ? { subscription: 'sub_2' } : {},
      });
    expect(page('payment')).toMatchObject({ pageKind: 'order', orderId: 'ref-1', pledgeId: null });
    expect(page('subscription')).toMatchObject({
      subject: 'page',
      subjectId: 'cs_1',
      pageKind: 'pledge',
      orderId: null,
      pledgeId: 'ref-1',
      subscriptionId: 'sub_1',
    });
    expect(page('setup')).toMatchObject({ pageKind: 'card', pledgeId: 'ref-1', subscriptionId: 'sub_2' });
  });

  it.each([
    ['payment_intent.succeeded', 'payment'],
    ['charge.refunded', 'charge'],
    ['charge.refund.updated', 'refund'],
    ['refund.failed', 'refund'],
    ['charge.dispute.funds_withdrawn', 'dispute'],
    ['customer.subscription.deleted', 'subscription'],
    ['customer.updated', 'customer'],
    ['invoice.payment_failed', 'invoice'],
    ['price.created', 'other'],
  ] as const)('knows %s as news of a %s', (type, subject) => {
    expect(readPaymentEvent(type, 'x_1', {}).subject).toBe(subject);
  });

  it('follows an invoice to its subscription and pledge, in an event as in a column of text', () => {
    const payload = {
      customer: { id: 'cus_1' },
      metadata: {},
      parent: { subscription_details: { subscription: 'sub_1', metadata: { pledge: 'pledge-1' } } },
    };
    const facts = readPaymentEvent('invoice.paid', 'in_1', payload);
    expect(facts).toMatchObject({
      subject: 'invoice',
      subjectId: 'in_1',
      subscriptionId: 'sub_1',
      pledgeId: 'pledge-1',
      customerId: 'cus_1',
    });
    expect(readPaymentEvent('invoice.paid', 'in_1', JSON.stringify(payload))).toEqual(facts);
  });

  it('names the payment of a refund and of a dispute, and the one that a payment is', () => {
    const refund = { payment_intent: 'pi_1', charge: 'ch_1', metadata: { order: 'order-1' } };
    expect(readPaymentEvent('refund.updated', 're_1', refund)).toMatchObject({
      paymentIntentId: 'pi_1',
      chargeId: 'ch_1',
      orderId: 'order-1',
      subscriptionId: null,
    });
    expect(readPaymentEvent('charge.dispute.closed', 'dp_1', refund).paymentIntentId).toBe('pi_1');
    expect(readPaymentEvent('payment_intent.succeeded', 'pi_2', {}).paymentIntentId).toBe('pi_2');
  });

  it('takes an odd payload for one that names nothing', () => {
    expect(readPaymentEvent('invoice.paid', 'in_1', { metadata: 7 })).toMatchObject({
      subject: 'invoice',
      pledgeId: null,
      subscriptionId: null,
    });
  });
});
