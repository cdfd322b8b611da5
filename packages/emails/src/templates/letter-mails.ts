import type { EmailBlock, EmailContent } from '../email-content.js';
import type { ConfirmNewsMessage, EmailWorkshop, LetterContent, ReprintRow } from '../email-message.js';
import { texts } from '../texts.js';

/** A reader's reprint list within a letter: what is needed first, then what is only for those it troubles. */
export function reprintBlocks(
  rows: readonly (ReprintRow & { isOnlyIfItTroubles: boolean })[],
  colourHex: string | undefined,
): EmailBlock[] {
  const words = texts.letter;
  const tableOf = (isOnlyIfItTroubles: boolean): EmailBlock[] => {
    const mine = rows.filter((row) => row.isOnlyIfItTroubles === isOnlyIfItTroubles);
    if (mine.length === 0) return [];
    const table: EmailBlock = {
      kind: 'parts-table',
      colourHex,
      rows: mine.map(({ code, name, quantity, why }) => ({ code, name, times: words.times(quantity), why })),
    };
    return isOnlyIfItTroubles ? [{ kind: 'paragraph', text: words.ifItTroubles }, table] : [table];
  };
  if (rows.length === 0) return [{ kind: 'paragraph', text: words.nothingToReprint }];
  return [...tableOf(false), ...tableOf(true)];
}

/** A letter's own words in the design of the mails, with why it comes and where such letters end. */
export function letterContent(letter: LetterContent): EmailContent {
  const words = texts.letter;
  const { subject, preheader, blocks, kit } = letter;
  return {
    subject: letter.isTest ? words.testSubject(subject) : subject,
    preheader,
    heading: subject,
    blocks: [...blocks],
    reason:
      letter.kind === 'news' ? words.newsReason : kit ? words.serviceReason(kit) : words.serviceReasonOfShop,
    stop:
      letter.kind === 'news'
        ? letter.stopLink === undefined
          ? undefined
          : { label: words.stopNews, link: letter.stopLink }
        : { label: words.account, link: letter.accountLink },
  };
}

export function confirmNews(message: ConfirmNewsMessage, workshop: EmailWorkshop): EmailContent {
  const words = texts.confirmNews;
  return {
    subject: words.subject(workshop.name),
    preheader: words.preheader,
    heading: words.heading,
    blocks: [
      { kind: 'paragraph', text: words.body(workshop.name) },
      { kind: 'button', label: words.button, link: message.link },
      { kind: 'pasted-link', intro: texts.pasteLink, link: message.link },
      { kind: 'paragraph', text: words.limits(message.days), isSoft: true },
    ],
    reason: words.reason,
  };
}
