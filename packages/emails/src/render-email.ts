import type { EmailContent } from './email-content.js';
import type { EmailMessage, EmailWorkshop, RenderedEmail } from './email-message.js';
import { plainStrings } from './plain-text.js';
import { renderHtml } from './render-html.js';
import { renderText } from './render-text.js';
import * as accountMails from './templates/account-mails.js';
import * as disputeMails from './templates/dispute-mails.js';
import * as deliveryMails from './templates/delivery-mails.js';
import * as fitMails from './templates/fit-mails.js';
import * as letterMails from './templates/letter-mails.js';
import * as orderMails from './templates/order-mails.js';
import * as pledgeMails from './templates/pledge-mails.js';
import * as pledgeRestMails from './templates/pledge-rest-mails.js';

function contentOf(message: EmailMessage, workshop: EmailWorkshop): EmailContent {
  switch (message.template) {
    case 'verify-address':
      return accountMails.verifyAddress(message, workshop);
    case 'sign-in-link':
      return accountMails.signInLink(message, workshop);
    case 'reset-passphrase':
      return accountMails.resetPassphrase(message, workshop);
    case 'address-already-joined':
      return accountMails.addressAlreadyJoined(message, workshop);
    case 'passphrase-changed':
      return accountMails.passphraseChanged(message, workshop);
    case 'order-paid':
      return orderMails.orderPaid(message, workshop);
    case 'new-download-link':
      return deliveryMails.newDownloadLink(message);
    case 'order-refunded':
      return orderMails.orderRefunded(message, workshop);
    case 'payment-disputed':
      return disputeMails.paymentDisputed(message, workshop);
    case 'staff-invite':
      return accountMails.staffInvite(message, workshop);
    case 'revision-released':
      return deliveryMails.revisionReleased(message);
    case 'revision-withdrawn':
      return deliveryMails.revisionWithdrawn(message);
    case 'gift-received':
      return deliveryMails.giftReceived(message, workshop);
    case 'pledge-began':
      return pledgeMails.pledgeBegan(message, workshop);
    case 'pledge-receipt':
      return pledgeMails.pledgeReceipt(message, workshop);
    case 'pledge-payment-failed':
    case 'pledge-grace-ends-soon':
      return pledgeMails.pledgeUnpaid(message, workshop);
    case 'pledge-plan-changes':
      return pledgeMails.pledgePlanChanges(message, workshop);
    case 'pledge-lapsed':
    case 'pledge-ended':
      return pledgeRestMails.pledgeOver(message);
    case 'pledge-will-end':
      return pledgeRestMails.pledgeWillEnd(message, workshop);
    case 'pledge-paused':
      return pledgeRestMails.pledgePaused(message, workshop);
    case 'pledge-resumes-soon':
      return pledgeRestMails.pledgeResumesSoon(message, workshop);
    case 'fit-answered':
      return fitMails.fitAnswered(message);
    case 'fit-fixed':
      return fitMails.fitFixed(message);
    case 'confirm-news':
      return letterMails.confirmNews(message, workshop);
    case 'letter-test':
      return message.content;
  }
}

/**
 * Puts content of one's own (a letter, say) into the design of the mails. Throws TypeError where a link is
 * no absolute http or https address.
 */
export function renderContent(content: EmailContent, workshop: EmailWorkshop): RenderedEmail {
  return {
    subject: plainStrings(content.subject).replaceAll('\u00a0', ' '),
    html: renderHtml(content, workshop),
    text: renderText(content, workshop),
  };
}

/**
 * Renders a mail of the shop. What the message holds is taken as plain text: control characters are dropped,
 * HTML is escaped. Throws TypeError for a link that is no web address or an instant that is none, and
 * MoneyError for an amount that is none.
 */
export function renderEmail(message: EmailMessage, workshop: EmailWorkshop): RenderedEmail {
  const plainWorkshop = plainStrings(workshop);
  // A letter's text has lines of its own, which its maker cleaned.
  const plainMessage = message.template === 'letter-test' ? message : plainStrings(message);
  return renderContent(contentOf(plainMessage, plainWorkshop), plainWorkshop);
}
