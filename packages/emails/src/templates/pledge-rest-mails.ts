import { formatMoney } from '@windchest/money';
import type { EmailBlock, EmailContent } from '../email-content.js';
import type { EmailWorkshop } from '../email-message.js';
import { greetedName } from '../plain-text.js';
import type {
  PledgeEndedMessage,
  PledgeLapsedMessage,
  PledgePausedMessage,
  PledgeResumesSoonMessage,
  PledgeWillEndMessage,
} from '../pledge-message.js';
import { pledgeTexts as words } from '../pledge-texts.js';
import { showDay } from '../show-instant.js';
import { texts } from '../texts.js';

const say = (text: string): EmailBlock => ({ kind: 'paragraph', text });
const hello = (name: string | undefined): EmailBlock => say(texts.hello(greetedName(name)));
const openPledge = (link: string): EmailBlock => ({ kind: 'button', label: words.openPledge, link });

/** It is over: lapsed for want of a payment, or ended by wish. */
export function pledgeOver(message: PledgeLapsedMessage | PledgeEndedMessage): EmailContent {
  const { subject, preheader, heading, body, button } =
    message.template === 'pledge-lapsed' ? words.lapsed : words.ended;
  return {
    subject: subject(message.plan),
    preheader,
    heading,
    blocks: [
      hello(message.name),
      say(body),
      say(words.lapsed.shelf[message.keeps]),
      { kind: 'button', label: button, link: message.supportLink },
      { kind: 'button', label: words.openPledge, link: message.pledgeLink, isSecondary: true },
    ],
    reason: words.reasonOver,
  };
}

export function pledgeWillEnd(message: PledgeWillEndMessage, workshop: EmailWorkshop): EmailContent {
  const day = showDay(message.endsAt, workshop.locale);
  const { subject, preheader, heading, body, shelf } = words.willEnd;
  return {
    subject: subject(day),
    preheader,
    heading: heading(day),
    blocks: [hello(message.name), say(body(day)), say(shelf[message.keeps]), openPledge(message.pledgeLink)],
    reason: words.reason,
  };
}

export function pledgePaused(message: PledgePausedMessage, workshop: EmailWorkshop): EmailContent {
  const day = showDay(message.nextPaymentAt, workshop.locale);
  const amount = formatMoney(message.amount, workshop.locale);
  const { subject, preheader, heading, body, shelf, sooner } = words.paused;
  return {
    subject: subject(day),
    preheader: preheader(day),
    heading: heading(day),
    blocks: [
      hello(message.name),
      say(body(showDay(message.restsFrom, workshop.locale), day, amount)),
      say(shelf[message.keeps]),
      openPledge(message.pledgeLink),
      { kind: 'paragraph', text: sooner, isSoft: true },
    ],
    reason: words.reason,
  };
}

export function pledgeResumesSoon(message: PledgeResumesSoonMessage, workshop: EmailWorkshop): EmailContent {
  const day = showDay(message.nextPaymentAt, workshop.locale);
  const amount = formatMoney(message.amount, workshop.locale);
  const { subject, preheader, heading, body, end } = words.resumes;
  return {
    subject: subject(day),
    preheader: preheader(amount, day),
    heading: heading(day),
    blocks: [
      hello(message.name),
      say(body(amount, day)),
      openPledge(message.pledgeLink),
      { kind: 'paragraph', text: end, isSoft: true },
    ],
    reason: words.reason,
  };
}
