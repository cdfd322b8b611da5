export { renderContent, renderEmail } from './render-email.js';
export { letterContent, reprintBlocks } from './templates/letter-mails.js';
export { styles as mailStyles } from './mail-styles.js';
export { greetedName } from './plain-text.js';
export { wrapText } from './wrap-text.js';
export { escapeHtml, escapeLink } from './escape-html.js';
export type { EmailBlock, EmailContent, PartRow, PriceRow, PriceSum, TitleCell } from './email-content.js';
export type {
  AddressAlreadyJoinedMessage,
  ConfirmNewsMessage,
  EmailMessage,
  EmailTemplate,
  EmailWorkshop,
  GiftReceivedMessage,
  KitTitle,
  LetterContent,
  LetterTestMessage,
  NewDownloadLinkMessage,
  OrderPaidMessage,
  OrderRefundedMessage,
  PaidLine,
  PassphraseChangedMessage,
  PaymentDisputedMessage,
  RenderedEmail,
  ReprintRow,
  ResetPassphraseMessage,
  RevisionReleasedMessage,
  RevisionWithdrawnMessage,
  SignInLinkMessage,
  StaffInviteMessage,
  TaxLine,
  VerifyAddressMessage,
} from './email-message.js';
export type { PledgeMessage } from './pledge-message.js';
