import { Refusal } from '../http/refusal.js';

export const paymentUnreachable = (): Refusal =>
  new Refusal(
    'payment-unreachable',
    'The payment service cannot be reached just now. Your order is kept and nothing is charged twice. Try again in a minute.',
    { retryAfterSeconds: 30 },
  );
