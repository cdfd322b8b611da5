import { decimalText, type Money, MoneyError, parseMoney } from '@windchest/money';

/** An amount as it is typed: `24.00`. */
export const amountText = (amount: Money): string => decimalText(amount);

/** Reads a typed amount; the fault is a sentence for the field. */
export function readAmount(text: string, currency: string): { minor: number } | { fault: string } {
  try {
    return { minor: parseMoney(text, currency).minor };
  } catch (thrown) {
    if (thrown instanceof MoneyError) return { fault: thrown.message };
    throw thrown;
  }
}
