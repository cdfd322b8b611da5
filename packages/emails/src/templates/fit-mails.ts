import type { EmailContent } from '../email-content.js';
import type { FitAnsweredMessage, FitFixedMessage } from '../email-message.js';
import { greetedName } from '../plain-text.js';
import { texts } from '../texts.js';

const say = (text: string) => ({ kind: 'paragraph', text }) as const;

export function fitAnswered(message: FitAnsweredMessage): EmailContent {
  const words = texts.fitAnswered;
  return {
    subject: words.subject(message.kit, message.part),
    preheader: words.preheader(message.by),
    heading: words.heading(message.part),
    blocks: [
      say(texts.hello(greetedName(message.name))),
      say(words.body(message.part, message.kit, texts.unbroken(message.revision))),
      { kind: 'quote', text: message.text, by: message.by },
      { kind: 'button', label: words.button, link: message.link, isSecondary: true },
    ],
    reason: words.reason,
  };
}

export function fitFixed(message: FitFixedMessage): EmailContent {
  const words = texts.fitFixed;
  const [from, to] = [texts.unbroken(message.revision), texts.unbroken(message.fixedIn)];
  return {
    subject: words.subject(message.kit, message.part, to),
    preheader: words.preheader(from),
    heading: words.heading(message.part, to),
    blocks: [
      say(texts.hello(greetedName(message.name))),
      say(words.body(message.part, message.kit, from, to)),
      { kind: 'button', label: words.button, link: message.link },
      { kind: 'paragraph', text: words.thanks, isSoft: true },
    ],
    reason: words.reason,
  };
}
