import { Refusal } from '../../http/refusal.js';

export const serviceAway = (): Refusal =>
  new Refusal(
    'payment-unreachable',
    'The payment service cannot be reached just now. Nothing was charged. Try again in a minute.',
    { retryAfterSeconds: 30 },
  );
