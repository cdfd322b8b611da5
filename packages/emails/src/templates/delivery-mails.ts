import type { EmailBlock, EmailContent } from '../email-content.js';
import type {
  EmailWorkshop,
  GiftReceivedMessage,
  NewDownloadLinkMessage,
  RevisionReleasedMessage,
  RevisionWithdrawnMessage,
} from '../email-message.js';
import { greetedName } from '../plain-text.js';
import { texts } from '../texts.js';

const say = (text: string) => ({ kind: 'paragraph', text }) as const;

export function newDownloadLink(message: NewDownloadLinkMessage): EmailContent {
  const words = texts.newDownloadLink;
  return {
    subject: words.subject(message.kits),
    preheader: words.preheader,
    heading: words.heading,
    blocks: [
      say(words.body(message.kits)),
      { kind: 'button', label: words.button, link: message.link },
      { kind: 'paragraph', text: words.limits(message.linkDays, message.linkUses), isSoft: true },
    ],
    reason: words.reason,
  };
}

export function revisionReleased(message: RevisionReleasedMessage): EmailContent {
  const words = texts.revisionReleased;
  const [from, to] = [texts.unbroken(message.from), texts.unbroken(message.to)];
  const pieces = message.reprint.reduce((all, { quantity }) => all + quantity, 0);
  const whatChanges: EmailBlock[] =
    pieces === 0
      ? [say(words.nothing(from)), { kind: 'button', label: words.getNotes, link: message.link }]
      : [
          say(words.reprint(from, pieces)),
          {
            kind: 'parts-table',
            colourHex: message.kitColourHex,
            rows: message.reprint.map(({ code, name, quantity, why }) => ({
              code,
              name,
              times: words.times(quantity),
              why,
            })),
          },
          say(words.rest),
          { kind: 'button', label: words.getChanged, link: message.link },
        ];
  return {
    subject: words.subject(message.kit, to, pieces),
    preheader: words.preheader(from),
    heading: words.heading(message.kit, to),
    blocks: [say(texts.hello(greetedName(message.name))), ...whatChanges],
    reason: words.reason(message.kit),
    stop: message.stopLink === undefined ? undefined : { label: words.stop, link: message.stopLink },
  };
}

export function revisionWithdrawn(message: RevisionWithdrawnMessage): EmailContent {
  const words = texts.revisionWithdrawn;
  const { kit, reason } = message;
  const revision = texts.unbroken(message.revision);
  const newest = message.newest === null ? null : texts.unbroken(message.newest);
  return {
    subject: words.subject(kit, revision),
    preheader: words.preheader,
    heading: words.heading(kit, revision),
    blocks: [
      say(words.body(kit, revision)),
      { kind: 'quote', text: reason, by: words.workshop },
      say(newest === null ? words.wait(revision) : words.takeInstead(revision, newest)),
      { kind: 'button', label: words.button, link: message.link },
    ],
    reason: words.reason(kit, revision),
  };
}

export function giftReceived(message: GiftReceivedMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.giftReceived;
  const from = greetedName(message.from) ?? workshop.name;
  const note: EmailBlock[] = message.note ? [{ kind: 'quote', text: message.note, by: from }] : [];
  const kits = message.kits.map(({ kit }) => kit);
  return {
    subject: words.subject(from, kits),
    preheader: words.preheader,
    heading: words.heading(kits),
    blocks: [
      say(texts.hello(greetedName(message.name))),
      say(words.body(from, kits)),
      ...message.kits.map(({ kit, revision, licence }) =>
        say(words.kit(kit, texts.unbroken(revision), licence)),
      ),
      ...note,
      { kind: 'button', label: words.button, link: message.link },
      { kind: 'paragraph', text: words.limits(message.linkDays, message.linkUses), isSoft: true },
      { kind: 'note', label: words.cautions, text: message.cautionsLine },
    ],
    reason: words.reason(from),
  };
}
