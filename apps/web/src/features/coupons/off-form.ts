import type { CouponOff } from '@windchest/contracts';
import { amountText, readAmount } from '../../lib/amount-text.js';

export type OffKind = 'percent' | 'third' | 'fraction' | 'amount';

/** What a coupon takes off, as it stands in the form. */
export interface OffForm {
  kind: OffKind;
  percent: number;
  numerator: number;
  denominator: number;
  /** As it is typed: `5.00`. */
  amount: string;
}

const emptyOff: OffForm = { kind: 'percent', percent: NaN, numerator: 1, denominator: 3, amount: '' };

/** Per cent with two decimals at most, as shops write them; NaN where a fraction is none. */
const percentOf = (numerator: number, denominator: number): number => {
  const hundredths = (numerator * 10_000) / denominator;
  return Number.isInteger(hundredths) ? hundredths / 100 : NaN;
};

export function offForm(off: CouponOff | null, currency: string): OffForm {
  if (!off) return emptyOff;
  if (off.kind === 'amount')
    return { ...emptyOff, kind: 'amount', amount: amountText({ minor: off.minor, currency }) };
  const { numerator, denominator } = off;
  if (numerator * 3 === denominator) return { ...emptyOff, kind: 'third' };
  const percent = percentOf(numerator, denominator);
  return Number.isNaN(percent)
    ? { ...emptyOff, kind: 'fraction', numerator, denominator }
    : { ...emptyOff, kind: 'percent', percent };
}

const commonDivisor = (a: number, b: number): number => (b === 0 ? a : commonDivisor(b, a % b));

/** An exact fraction of a percentage: 15 % is 3/20. Null where it has more than two decimals. */
export function fractionOfPercent(percent: number): { numerator: number; denominator: number } | null {
  const hundredths = Math.round(percent * 100);
  if (!(Math.abs(hundredths - percent * 100) < 1e-6) || hundredths < 1) return null;
  const divisor = commonDivisor(hundredths, 10_000);
  return { numerator: hundredths / divisor, denominator: 10_000 / divisor };
}

/** In the shape of the contract; what cannot be read becomes NaN, which the contract refuses. */
export function offBody(form: OffForm, currency: string): unknown {
  switch (form.kind) {
    case 'third':
      return { kind: 'fraction', numerator: 1, denominator: 3 };
    case 'percent':
      return { kind: 'fraction', ...(fractionOfPercent(form.percent) ?? { numerator: NaN, denominator: 1 }) };
    case 'fraction':
      return { kind: 'fraction', numerator: form.numerator, denominator: form.denominator };
    case 'amount': {
      const read = readAmount(form.amount, currency);
      return { kind: 'amount', minor: 'minor' in read ? read.minor : NaN };
    }
  }
}
