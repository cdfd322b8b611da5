import { formatMoney } from '@windchest/money';
import type { EmailContent } from '../email-content.js';
import type { EmailWorkshop, PaymentDisputedMessage } from '../email-message.js';
import { greetedName } from '../plain-text.js';
import { showInstant } from '../show-instant.js';
import { texts } from '../texts.js';

/** The service's words, `product_not_received`, with spaces. */
const plainReason = (reason: string): string => reason.replaceAll('_', ' ');

export function paymentDisputed(message: PaymentDisputedMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.paymentDisputed;
  const { stand } = message;
  const amount = formatMoney(message.amount, workshop.locale);
  const isWaiting = stand === 'open' || stand === 'inquiry';
  return {
    subject: words.subjects[stand](message.orderNumber),
    preheader: words.preheader(message.buyer),
    heading: words.headings[stand],
    blocks: [
      { kind: 'paragraph', text: texts.hello(greetedName(message.name)) },
      { kind: 'paragraph', text: words.bodies[stand](amount) },
      { kind: 'button', label: words.button, link: message.orderLink },
      {
        kind: 'title-block',
        cells: [
          { label: words.orderLabel, value: message.orderNumber },
          { label: words.buyerLabel, value: message.buyer },
          { label: words.amountLabel, value: amount },
          { label: words.reasonLabel, value: plainReason(message.reason) },
          ...(isWaiting && message.answerBy
            ? [{ label: words.answerByLabel, value: showInstant(message.answerBy, workshop.locale) }]
            : []),
        ],
      },
    ],
    reason: words.reason,
  };
}
