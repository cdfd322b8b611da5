import { add, formatMoney, type Money } from '@windchest/money';
import type { EmailBlock, EmailContent, PriceSum } from '../email-content.js';
import type { EmailWorkshop, OrderPaidMessage, OrderRefundedMessage, PaidLine } from '../email-message.js';
import { greetedName } from '../plain-text.js';
import { texts } from '../texts.js';

const say = (text: string) => ({ kind: 'paragraph', text }) as const;
const minus = (shown: string): string => `\u2212${shown}`;

export function orderPaid(message: OrderPaidMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.orderPaid;
  const show = (amount: Money): string => formatMoney(amount, workshop.locale);
  const isFree = message.total.minor === 0;

  // The column shows prices before the discount, so that it adds up to the subtotal under it.
  const lineRow = ({ kit, licence, revision, total, discount }: PaidLine) => {
    const isLowered = discount !== undefined && discount.minor > 0;
    return {
      title: kit,
      detail: words.lineDetail(texts.unbroken(revision), licence, isLowered ? show(discount) : undefined),
      amount: show(isLowered ? add(total, discount) : total),
    };
  };
  const { discount } = message;
  const lowered: PriceSum[] =
    discount === undefined || discount.minor === 0
      ? []
      : [
          { label: words.subtotal, amount: show(message.subtotal) },
          { label: words.discount(message.couponCode), amount: minus(show(discount)) },
        ];

  const kits = message.lines.map(({ kit }) => kit);
  const { giftTo, taxNote } = message;
  const handedOver: EmailBlock[] =
    giftTo === undefined
      ? [
          { kind: 'button', label: words.button, link: message.link },
          { kind: 'paragraph', text: words.limits(message.linkDays, message.linkUses), isSoft: true },
        ]
      : [
          say(words.giftSent(giftTo, kits)),
          { kind: 'button', label: words.openOrder, link: message.orderLink },
        ];
  const cautions: EmailBlock[] =
    giftTo === undefined ? [{ kind: 'note', label: words.cautions, text: message.cautionsLine }] : [];

  return {
    subject: giftTo === undefined ? words.subject(kits) : words.giftSubject(kits),
    preheader:
      giftTo === undefined
        ? words.preheader(message.orderNumber, show(message.total))
        : words.giftPreheader(message.orderNumber, show(message.total)),
    heading: giftTo === undefined ? words.heading : words.giftHeading,
    blocks: [
      say(texts.hello(greetedName(message.name))),
      say(isFree ? words.free : words.paid(show(message.total))),
      ...handedOver,
      {
        kind: 'price-table',
        rows: message.lines.map(lineRow),
        sums: [
          ...lowered,
          { label: words.total, amount: show(message.total), isTotal: true },
          ...message.tax.map(({ rateLabel, amount }) => ({
            label: words.taxWithin(texts.unbroken(rateLabel)),
            amount: show(amount),
            isSoft: true,
          })),
        ],
      },
      ...(taxNote === undefined ? [] : [{ ...say(taxNote), isSoft: true }]),
      ...cautions,
      {
        kind: 'title-block',
        cells: [
          { label: words.orderLabel, value: message.orderNumber, link: message.orderLink },
          { label: words.receiptLabel, value: message.receiptNumber },
        ],
      },
    ],
    reason: words.reason,
  };
}

export function orderRefunded(message: OrderRefundedMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.orderRefunded;
  const show = (amount: Money): string => formatMoney(amount, workshop.locale);
  const amount = show(message.amount);
  const isDispute = message.cause === 'dispute';
  const { lines = [], keptKits = [], endedKits, tax = [] } = message;
  const kits: EmailBlock[] = [];
  const { giftTo } = message;
  if (endedKits.length > 0)
    kits.push(say(giftTo === undefined ? words.ended(endedKits) : words.giftEnded(giftTo, endedKits)));
  if (keptKits.length > 0)
    kits.push(say(giftTo === undefined ? words.kept(keptKits) : words.giftKept(giftTo, keptKits)));
  if (message.couponCode) kits.push({ ...say(words.couponIsSpent(message.couponCode)), isSoft: true });

  return {
    subject: (isDispute ? words.disputeSubject : words.subject)(amount, message.orderNumber),
    preheader: words.preheader(message.creditNoteNumber),
    heading: isDispute ? words.disputeHeading : words.heading(amount),
    blocks: [
      say(texts.hello(greetedName(message.name))),
      say(isDispute ? words.disputeBody(amount) : words.body(amount)),
      ...kits,
      { kind: 'button', label: words.button, link: message.orderLink },
      {
        kind: 'price-table',
        rows: lines.map((line) => ({
          title: line.kit,
          detail: words.lineDetail(line.licence, line.endsRight),
          amount: show(line.amount),
        })),
        sums: [
          { label: words.total, amount, isTotal: true },
          ...tax.map((line) => ({
            label: words.taxWithin(texts.unbroken(line.rateLabel)),
            amount: show(line.amount),
            isSoft: true,
          })),
        ],
      },
      {
        kind: 'title-block',
        cells: [
          { label: words.orderLabel, value: message.orderNumber },
          { label: words.receiptLabel, value: message.receiptNumber },
          { label: words.creditNoteLabel, value: message.creditNoteNumber },
          { label: words.amountLabel, value: amount },
        ],
      },
    ],
    reason: words.reason,
  };
}
