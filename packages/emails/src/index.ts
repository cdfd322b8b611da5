export { renderContent, renderEmail } from './render-email.js';
export { escapeHtml } from './escape-html.js';
export type { EmailBlock, EmailContent, PartRow, PriceRow, PriceSum, TitleCell } from './email-content.js';
export type {
  AddressAlreadyJoinedMessage,
  EmailMessage,
  EmailTemplate,
  EmailWorkshop,
  GiftReceivedMessage,
  KitTitle,
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
