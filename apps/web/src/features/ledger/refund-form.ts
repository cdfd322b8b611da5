import type { InputOf, WorkshopOrder } from '@windchest/contracts';
import { amountText, readAmount } from '../../lib/amount-text.js';

export interface RefundForm {
  /** In the order's own sequence. */
  lines: {
    /** As it is typed: `16.00`; empty where nothing goes back. */
    amount: string;
    keepsEntitlement: boolean;
  }[];
  reason: string;
}

export interface RefundPlan {
  readonly totalMinor: number;
  /** Kits whose right ends, and kits of which money goes back and the right stays. */
  readonly ending: readonly string[];
  readonly staying: readonly string[];
  readonly lines: NonNullable<InputOf<'POST /workshop/orders/:orderId/refunds'>['body']['lines']>;
}

type Line = WorkshopOrder['lines'][number];

/** What of a line can still go back: what was asked for already counts as gone. */
export function leftOf({ refunds }: Pick<WorkshopOrder, 'refunds'>, line: Line): number {
  const asked = refunds
    .filter((refund) => refund.state === 'asked')
    .flatMap((refund) => refund.lines)
    .filter((one) => one.orderLineId === line.id)
    .reduce((sum, one) => sum + one.amount.minor, 0);
  return Math.max(0, line.total.minor - line.refunded.minor - asked);
}

/** An order of one kit most often goes back whole; of several somebody must say which. */
export const emptyRefund = (order: WorkshopOrder): RefundForm => ({
  lines: order.lines.map((line) => ({
    amount: order.lines.length === 1 ? amountText({ ...line.total, minor: leftOf(order, line) }) : '',
    keepsEntitlement: false,
  })),
  reason: '',
});

export const wholeRefund = (order: WorkshopOrder): RefundForm['lines'] =>
  order.lines.map((line) => {
    const minor = leftOf(order, line);
    return { amount: minor > 0 ? amountText({ ...line.total, minor }) : '', keepsEntitlement: false };
  });

/** What a typed amount is; nothing typed is nothing. */
export const typedMinor = (text: string, currency: string): number => {
  if (text.trim() === '') return 0;
  const read = readAmount(text, currency);
  return 'minor' in read ? Math.max(0, read.minor) : 0;
};

/** What will happen if the form is sent as it stands. */
export function planRefund(form: RefundForm, order: WorkshopOrder): RefundPlan {
  const planned = order.lines.map((line, at) => ({
    line,
    minor: Math.min(typedMinor(form.lines[at]?.amount ?? '', order.total.currency), leftOf(order, line)),
    keepsEntitlement: form.lines[at]?.keepsEntitlement ?? false,
  }));
  const going = planned.filter((one) => one.minor > 0);
  const isAll = planned.every(({ line, minor }) => minor === leftOf(order, line));
  // A kit that cost nothing has nothing to go back; its right goes with the rest of the order.
  const free = going.length > 0 && isAll ? planned.filter(({ line }) => line.total.minor === 0) : [];
  const sent = [...going, ...free];
  const isRunning = ({ line }: { line: Line }) => line.right === 'active' || line.right === 'suspended';
  const namesOf = (lines: typeof sent) => [...new Set(lines.map(({ line }) => line.kitName))];
  return {
    totalMinor: going.reduce((sum, one) => sum + one.minor, 0),
    ending: namesOf(sent.filter((one) => isRunning(one) && !one.keepsEntitlement)),
    staying: namesOf(sent.filter((one) => isRunning(one) && one.keepsEntitlement)),
    lines: sent.map(({ line, minor, keepsEntitlement }) => ({
      orderLineId: line.id,
      amountMinor: minor,
      keepsEntitlement,
    })),
  };
}
