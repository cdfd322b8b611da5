/** What can be wrong with an amount; the web and the API switch on it. */
export type MoneyErrorCode =
  | 'not-a-safe-integer'
  | 'unknown-currency'
  | 'mixed-currencies'
  | 'nothing-to-sum'
  | 'bad-percent'
  | 'bad-weights'
  | 'negative-amount'
  | 'refund-exceeds-paid'
  | 'bad-amount-text'
  | 'too-many-decimals'
  | 'bad-locale';

/** Thrown by every function of this package; the message is a sentence fit to be shown. */
export class MoneyError extends Error {
  readonly code: MoneyErrorCode;

  constructor(code: MoneyErrorCode, message: string) {
    super(message);
    this.name = 'MoneyError';
    this.code = code;
  }
}
