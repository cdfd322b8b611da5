import type { EmailContent } from '../email-content.js';
import type {
  AddressAlreadyJoinedMessage,
  EmailWorkshop,
  PassphraseChangedMessage,
  ResetPassphraseMessage,
  SignInLinkMessage,
  StaffInviteMessage,
  VerifyAddressMessage,
} from '../email-message.js';
import { greetedName } from '../plain-text.js';
import { showInstant } from '../show-instant.js';
import { texts } from '../texts.js';

const greeting = (name: string | undefined) =>
  ({ kind: 'paragraph', text: texts.hello(greetedName(name)) }) as const;
const say = (text: string) => ({ kind: 'paragraph', text }) as const;
const saySoftly = (text: string) => ({ kind: 'paragraph', text, isSoft: true }) as const;
const pastedLink = (link: string) => ({ kind: 'pasted-link', intro: texts.pasteLink, link }) as const;

export function verifyAddress(message: VerifyAddressMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.verifyAddress;
  return {
    subject: words.subject(workshop.name),
    preheader: words.preheader(message.hours),
    heading: words.heading,
    blocks: [
      greeting(message.name),
      say(words.body(workshop.name)),
      { kind: 'button', label: words.button, link: message.link },
      saySoftly(words.limits(message.hours)),
      pastedLink(message.link),
    ],
    reason: words.reason,
  };
}

export function signInLink(message: SignInLinkMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.signInLink;
  return {
    subject: words.subject(workshop.name),
    preheader: words.preheader(message.minutes),
    heading: words.heading,
    blocks: [
      say(words.body),
      { kind: 'button', label: words.button, link: message.link },
      saySoftly(words.limits(message.minutes)),
      pastedLink(message.link),
    ],
    reason: words.reason,
  };
}

export function resetPassphrase(message: ResetPassphraseMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.resetPassphrase;
  return {
    subject: words.subject(workshop.name),
    preheader: words.preheader(message.minutes),
    heading: words.heading,
    blocks: [
      say(words.body),
      { kind: 'button', label: words.button, link: message.link },
      saySoftly(words.limits(message.minutes)),
      pastedLink(message.link),
    ],
    reason: words.reason,
  };
}

export function addressAlreadyJoined(
  message: AddressAlreadyJoinedMessage,
  workshop: EmailWorkshop,
): EmailContent {
  const words = texts.addressAlreadyJoined;
  return {
    subject: words.subject(workshop.name),
    preheader: words.preheader,
    heading: words.heading,
    blocks: [
      greeting(message.name),
      say(words.body(workshop.name)),
      say(words.next),
      { kind: 'button', label: words.signIn, link: message.signInLink },
      { kind: 'button', label: words.reset, link: message.resetLink, isSecondary: true },
    ],
    reason: words.reason,
  };
}

export function passphraseChanged(message: PassphraseChangedMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.passphraseChanged;
  const when = showInstant(message.when, workshop.locale);
  return {
    subject: words.subject(workshop.name),
    preheader: words.preheader(when),
    heading: words.heading,
    blocks: [
      greeting(message.name),
      say(words.body(when)),
      say(words.ifYou),
      say(words.ifNot),
      message.resetLink === undefined
        ? { kind: 'button', label: words.open(workshop.name), link: workshop.baseUrl, isSecondary: true }
        : { kind: 'button', label: words.button, link: message.resetLink, isSecondary: true },
    ],
    reason: words.reason,
  };
}

export function staffInvite(message: StaffInviteMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.staffInvite;
  return {
    subject: words.subject(workshop.name),
    preheader: words.preheader(message.role, message.days),
    heading: words.heading,
    blocks: [
      greeting(message.name),
      say(words.body(message.invitedBy, workshop.name, message.role)),
      { kind: 'button', label: words.button, link: message.link },
      saySoftly(words.limits(message.days)),
      pastedLink(message.link),
    ],
    reason: words.reason,
  };
}
