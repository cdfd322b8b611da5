import type { Handled } from '@windchest/contracts';
import { formatMoney, money, spread } from '@windchest/money';
import { Refusal } from '../../http/refusal.js';

export type RefundWish = Pick<Handled<'POST /workshop/orders/:orderId/refunds'>['body'], 'lines' | 'whole'>;

/** A line of an order as a refund sees it, in minor units. */
export interface RefundableOrderLine {
  readonly id: string;
  readonly kitName: string;
  readonly licenceName: string;
  readonly totalMinor: number;
  /** Went back already. */
  readonly refundedMinor: number;
  /** Asked of the payment service, which has not confirmed it yet. */
  readonly askedMinor: number;
}

export interface PlannedLine {
  readonly orderLineId: string;
  readonly amountMinor: number;
  readonly keepsEntitlement: boolean;
}

/**
 * What goes back of each line: what is asked for, or all that is left. A line under a coupon has only what was
 * paid for it to give back.
 * @throws Refusal that names the line and what is left of it
 */
export const planRefund = (
  wish: RefundWish,
  lines: readonly RefundableOrderLine[],
  { currency, locale }: { currency: string; locale: string },
): PlannedLine[] => {
  const show = (minor: number) => formatMoney({ minor, currency }, locale);
  // Below zero where the payment service gave back by itself what was asked for here as well.
  const remainsOf = (line: RefundableOrderLine): number =>
    Math.max(0, line.totalMinor - line.refundedMinor - line.askedMinor);
  const planned = wish.whole
    ? lines.map((line) => ({
        orderLineId: line.id,
        amountMinor: remainsOf(line),
        keepsEntitlement: wish.whole?.keepsEntitlement ?? false,
      }))
    : (wish.lines ?? []).map((asked) => {
        const line = lines.find((one) => one.id === asked.orderLineId);
        if (!line) throw refused('One of the lines is not of this order. Reload the page.');
        const left = remainsOf(line);
        if (asked.amountMinor > left)
          throw refused(
            left === 0
              ? `Nothing is left to give back for ${line.kitName}.`
              : `For ${line.kitName} no more than ${show(left)} can go back. Ask for that or less.`,
          );
        if (asked.amountMinor === 0 && line.totalMinor > 0)
          throw refused(`Write how much goes back for ${line.kitName}, or leave the line out.`);
        return asked;
      });
  if (planned.every((line) => line.amountMinor === 0))
    throw refused('Nothing is left to give back for this order.');
  return planned;
};

const refused = (sentence: string): Refusal =>
  new Refusal('refund-refused', sentence, { fields: { lines: sentence } });

/**
 * The lines of a refund that nobody asked for here: its amount over what is left of each line, by largest
 * remainder. Where all is given back the rights end; after a part of it they stay until staff decide.
 * @param amountMinor no more than what is left of the lines together
 */
export const spreadRefund = (
  amountMinor: number,
  lines: readonly Pick<RefundableOrderLine, 'id' | 'totalMinor' | 'refundedMinor'>[],
  currency: string,
): PlannedLine[] => {
  const left = lines.map((line) => line.totalMinor - line.refundedMinor);
  const isAll = amountMinor === left.reduce((sum, minor) => sum + minor, 0);
  return spread(money(amountMinor, currency), left).map((amount, at) => ({
    orderLineId: lines[at]?.id ?? '',
    amountMinor: amount.minor,
    keepsEntitlement: !isAll,
  }));
};

/** Whether lines still have what a refund planned for them: another one may have been quicker. */
export const isStillLeft = (
  planned: readonly PlannedLine[],
  lines: readonly Pick<RefundableOrderLine, 'id' | 'totalMinor' | 'refundedMinor'>[],
): boolean =>
  planned.every(({ orderLineId, amountMinor }) => {
    const line = lines.find((one) => one.id === orderLineId);
    return line !== undefined && line.refundedMinor + amountMinor <= line.totalMinor;
  });
