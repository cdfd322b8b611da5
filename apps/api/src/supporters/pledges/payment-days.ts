const DAY_MS = 86_400_000;

/**
 * The day of the payment so many months after another one, by the day on which the pledge began: the 31st is paid
 * on the last day of shorter months and on the 31st again after them.
 */
export const paymentAfter = (payment: Date, months: number, firstPayment: Date): Date => {
  const between =
    (payment.getUTCFullYear() - firstPayment.getUTCFullYear()) * 12 +
    payment.getUTCMonth() -
    firstPayment.getUTCMonth();
  return monthsAfter(firstPayment, between + months);
};

const monthsAfter = (first: Date, months: number): Date => {
  const [year, month] = [first.getUTCFullYear(), first.getUTCMonth() + months];
  const lastDay = new Date(Date.UTC(year, month + 1, 1) - DAY_MS).getUTCDate();
  const midnight = Date.UTC(year, month, Math.min(first.getUTCDate(), lastDay));
  return new Date(midnight + (first.getTime() % DAY_MS));
};
