import type { Money } from '@windchest/money';

/** The workshop as a mail shows it. `locale` is a language tag for amounts and dates, such as `en-GB`. */
export type EmailWorkshop = {
  name: string;
  baseUrl: string;
  address?: string;
  replyTo?: string;
  locale: string;
};

export type RenderedEmail = { subject: string; html: string; text: string };

/** Somebody joined: asks to confirm the address. The link holds for `hours`. */
export type VerifyAddressMessage = { template: 'verify-address'; name: string; link: string; hours: number };

/** A one-time sign-in link, good for `minutes`. */
export type SignInLinkMessage = { template: 'sign-in-link'; link: string; minutes: number };

/** A link to choose a new passphrase, good for `minutes`. */
export type ResetPassphraseMessage = { template: 'reset-passphrase'; link: string; minutes: number };

/** Sent to the address itself, so that the joining page need not reveal that an account exists. */
export type AddressAlreadyJoinedMessage = {
  template: 'address-already-joined';
  name: string;
  signInLink: string;
  resetLink: string;
};

/** `when` is an ISO 8601 instant; `resetLink` leads to the page that starts a reset. */
export type PassphraseChangedMessage = {
  template: 'passphrase-changed';
  name: string;
  when: string;
  resetLink?: string;
};

/** A kit as a mail names it; `revision` as it is shown, such as `Mk 1.4`. */
export type KitTitle = { kit: string; licence: string; revision: string };

/** `total` is what the line costs after its `discount`. */
export type PaidLine = KitTitle & { total: Money; discount?: Money };

/** `rateLabel` names the tax and its rate, such as `VAT 19 %`. */
export type TaxLine = { rateLabel: string; amount: Money };

/**
 * The order is paid (or free). `subtotal` is before the discount, `total` after it, tax included. `link`
 * leads to the download page, never to a file: mail scanners open links.
 */
export type OrderPaidMessage = {
  template: 'order-paid';
  name?: string;
  orderNumber: string;
  receiptNumber: string;
  lines: PaidLine[];
  subtotal: Money;
  discount?: Money;
  couponCode?: string;
  total: Money;
  tax: TaxLine[];
  link: string;
  linkDays: number;
  linkUses: number;
  orderLink: string;
  cautionsLine: string;
};

/** A fresh link to the download page, asked for by the buyer or sent by staff. */
export type NewDownloadLinkMessage = {
  template: 'new-download-link';
  link: string;
  linkDays: number;
  linkUses: number;
  kits: string[];
};

/** `endedKits` leave the shelf with this refund; `keptKits` stay although money went back. */
export type OrderRefundedMessage = {
  template: 'order-refunded';
  name?: string;
  orderNumber: string;
  receiptNumber: string;
  creditNoteNumber: string;
  amount: Money;
  tax?: TaxLine[];
  endedKits: string[];
  keptKits?: string[];
  orderLink: string;
};

/** An invitation to the staff side; `role` as it is shown. */
export type StaffInviteMessage = {
  template: 'staff-invite';
  name: string;
  role: string;
  invitedBy: string;
  link: string;
  days: number;
};

export type ReprintRow = { code: string; name: string; quantity: number; why: string };

/**
 * A newer revision of a kit the reader holds. `from` is the revision held, `reprint` that reader's own
 * reprint list. `kitColourHex` (`#rrggbb`) marks the parts; `stopLink` ends these mails.
 */
export type RevisionReleasedMessage = {
  template: 'revision-released';
  name?: string;
  kit: string;
  from: string;
  to: string;
  reprint: ReprintRow[];
  link: string;
  kitColourHex?: string;
  stopLink?: string;
};

/** A revision that the reader holds was withdrawn; `newest` is the one to take instead, where there is one. */
export type RevisionWithdrawnMessage = {
  template: 'revision-withdrawn';
  kit: string;
  revision: string;
  reason: string;
  newest: string | null;
  link: string;
};

/** `from` is the giver; without it the kit comes from the workshop itself. `note` is the giver's own words. */
export type GiftReceivedMessage = KitTitle & {
  template: 'gift-received';
  name?: string;
  from?: string;
  note?: string;
  link: string;
  linkDays: number;
  linkUses: number;
  cautionsLine: string;
};

/** The workshop answers a report about how a part fits; `text` is the answer's own words. */
export type FitAnsweredMessage = {
  template: 'fit-answered';
  name?: string;
  kit: string;
  revision: string;
  part: string;
  by: string;
  text: string;
  link: string;
};

/** The revision that mends a reported part is out. */
export type FitFixedMessage = {
  template: 'fit-fixed';
  name?: string;
  kit: string;
  revision: string;
  part: string;
  fixedIn: string;
  link: string;
};

/** Every mail the shop sends by itself, told apart by `template`. */
export type EmailMessage =
  | VerifyAddressMessage
  | SignInLinkMessage
  | ResetPassphraseMessage
  | AddressAlreadyJoinedMessage
  | PassphraseChangedMessage
  | OrderPaidMessage
  | NewDownloadLinkMessage
  | OrderRefundedMessage
  | StaffInviteMessage
  | RevisionReleasedMessage
  | RevisionWithdrawnMessage
  | GiftReceivedMessage
  | FitAnsweredMessage
  | FitFixedMessage;

export type EmailTemplate = EmailMessage['template'];
