import type { Money } from '@windchest/money';

/** What stays on the shelf when a pledge ends, by the plan. */
export type PledgeKeeps = 'nothing' | 'released-during' | 'released-before-end';

/** A mail about one pledge; `plan` is the plan's name, `pledgeLink` the page of the pledge in the account. */
type AboutPledge = { name?: string; plan: string; pledgeLink: string };
type WithReceipt = {
  amount: Money;
  receiptNumber: string;
  /** `rateLabel` names the tax and its rate, such as `VAT 19 %`. */
  tax: { rateLabel: string; amount: Money }[];
};

/** The first payment has arrived. `kits` are those on the shelf now; moments are ISO 8601 instants. */
export type PledgeBeganMessage = AboutPledge &
  WithReceipt & { template: 'pledge-began'; kits: string[]; nextPaymentAt: string; shelfLink: string };

/** A later month is paid. */
export type PledgeReceiptMessage = AboutPledge &
  WithReceipt & { template: 'pledge-receipt'; periodStart: string; periodEnd: string };

/** `settleLink` is the payment service's page where any card will do; without it the card is changed at the pledge. */
type Failed = AboutPledge & { amount: Money; graceUntil: string; settleLink?: string };
export type PledgePaymentFailedMessage = Failed & { template: 'pledge-payment-failed' };
export type PledgeGraceEndsSoonMessage = Failed & { template: 'pledge-grace-ends-soon' };

type Over = AboutPledge & { keeps: PledgeKeeps; supportLink: string };
export type PledgeLapsedMessage = Over & { template: 'pledge-lapsed' };
export type PledgeEndedMessage = Over & { template: 'pledge-ended' };

/** Its end was asked for, and the paid time runs until `endsAt`. */
export type PledgeWillEndMessage = AboutPledge & {
  template: 'pledge-will-end';
  endsAt: string;
  keeps: PledgeKeeps;
};

/** `restsFrom` is the end of what is paid, `nextPaymentAt` the day of the payment with which it goes on. */
export type PledgePausedMessage = AboutPledge & {
  template: 'pledge-paused';
  restsFrom: string;
  nextPaymentAt: string;
  amount: Money;
  keeps: PledgeKeeps;
};
export type PledgeResumesSoonMessage = AboutPledge & {
  template: 'pledge-resumes-soon';
  nextPaymentAt: string;
  amount: Money;
};

/** Another plan was chosen, from the payment at `from` on. */
export type PledgePlanChangesMessage = AboutPledge & {
  template: 'pledge-plan-changes';
  nextPlan: string;
  amount: Money;
  from: string;
};

export type PledgeMessage =
  | PledgeBeganMessage
  | PledgeReceiptMessage
  | PledgePaymentFailedMessage
  | PledgeGraceEndsSoonMessage
  | PledgeLapsedMessage
  | PledgeWillEndMessage
  | PledgeEndedMessage
  | PledgePausedMessage
  | PledgeResumesSoonMessage
  | PledgePlanChangesMessage;
