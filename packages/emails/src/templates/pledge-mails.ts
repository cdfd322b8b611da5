import { formatMoney, type Money } from '@windchest/money';
import type { EmailBlock, EmailContent, TitleCell } from '../email-content.js';
import type { EmailWorkshop } from '../email-message.js';
import { greetedName } from '../plain-text.js';
import type {
  PledgeBeganMessage,
  PledgeGraceEndsSoonMessage,
  PledgePaymentFailedMessage,
  PledgePlanChangesMessage,
  PledgeReceiptMessage,
} from '../pledge-message.js';
import { pledgeTexts as words } from '../pledge-texts.js';
import { showDay } from '../show-instant.js';
import { texts } from '../texts.js';

const say = (text: string): EmailBlock => ({ kind: 'paragraph', text });
const hello = (name: string | undefined): EmailBlock => say(texts.hello(greetedName(name)));
const openPledge = (link: string, isSecondary = false): EmailBlock => ({
  kind: 'button',
  label: words.openPledge,
  link,
  isSecondary,
});

const receiptCells = (
  message: PledgeBeganMessage | PledgeReceiptMessage,
  show: (amount: Money) => string,
): TitleCell[] => [
  { label: words.planLabel, value: message.plan },
  { label: words.paidLabel, value: show(message.amount) },
  { label: words.receiptLabel, value: message.receiptNumber },
  ...message.tax.map(({ rateLabel, amount }) => ({
    label: words.taxWithin(texts.unbroken(rateLabel)),
    value: show(amount),
  })),
];

export function pledgeBegan(message: PledgeBeganMessage, workshop: EmailWorkshop): EmailContent {
  const show = (amount: Money): string => formatMoney(amount, workshop.locale);
  const { subject, preheader, heading, body, kits, button, end } = words.began;
  return {
    subject: subject(message.plan),
    preheader: preheader(show(message.amount)),
    heading,
    blocks: [
      hello(message.name),
      say(body(show(message.amount))),
      say(kits(message.kits)),
      { kind: 'button', label: button, link: message.shelfLink },
      { kind: 'paragraph', text: end, isSoft: true },
      openPledge(message.pledgeLink, true),
      {
        kind: 'title-block',
        cells: [
          ...receiptCells(message, show),
          { label: words.nextLabel, value: showDay(message.nextPaymentAt, workshop.locale) },
        ],
      },
    ],
    reason: words.reason,
  };
}

export function pledgeReceipt(message: PledgeReceiptMessage, workshop: EmailWorkshop): EmailContent {
  const show = (amount: Money): string => formatMoney(amount, workshop.locale);
  const day = (moment: string): string => showDay(moment, workshop.locale);
  const { subject, preheader, heading, body } = words.receipt;
  const period = words.period(day(message.periodStart), day(message.periodEnd));
  return {
    subject: subject(message.receiptNumber),
    preheader: preheader(show(message.amount)),
    heading: heading(show(message.amount)),
    blocks: [
      hello(message.name),
      say(body(message.plan, period)),
      openPledge(message.pledgeLink),
      { kind: 'title-block', cells: receiptCells(message, show) },
    ],
    reason: words.reason,
  };
}

/** The bank said no, or it has been saying so for days. */
export function pledgeUnpaid(
  message: PledgePaymentFailedMessage | PledgeGraceEndsSoonMessage,
  workshop: EmailWorkshop,
): EmailContent {
  const amount = formatMoney(message.amount, workshop.locale);
  const until = showDay(message.graceUntil, workshop.locale);
  const isFirst = message.template === 'pledge-payment-failed';
  const { settleLink } = message;
  const ways: EmailBlock[] = settleLink
    ? [{ kind: 'button', label: words.failed.pay, link: settleLink }, openPledge(message.pledgeLink, true)]
    : [{ kind: 'button', label: words.failed.card, link: message.pledgeLink }];
  return {
    subject: isFirst ? words.failed.subject(message.plan) : words.graceEnds.subject(until),
    preheader: isFirst ? words.failed.preheader(until) : words.graceEnds.preheader,
    heading: isFirst ? words.failed.heading : words.graceEnds.heading(until),
    blocks: [
      hello(message.name),
      say(isFirst ? words.failed.body(amount) : words.graceEnds.body(amount)),
      say(words.failed.until(until)),
      ...ways,
      {
        kind: 'title-block',
        cells: [
          { label: words.planLabel, value: message.plan },
          { label: words.amountLabel, value: amount },
        ],
      },
    ],
    reason: words.reason,
  };
}

export function pledgePlanChanges(message: PledgePlanChangesMessage, workshop: EmailWorkshop): EmailContent {
  const amount = formatMoney(message.amount, workshop.locale);
  const day = showDay(message.from, workshop.locale);
  const { subject, preheader, heading, body } = words.planChanges;
  return {
    subject: subject(message.nextPlan, day),
    preheader: preheader(amount),
    heading,
    blocks: [
      hello(message.name),
      say(body(message.plan, message.nextPlan, day, amount)),
      openPledge(message.pledgeLink),
    ],
    reason: words.reason,
  };
}
