import type { EmailBlock, EmailContent } from './email-content.js';
import type { Money } from '@windchest/money';
import type { PledgeMessage } from './pledge-message.js';

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
  /** What is to be said where no tax is charged. */
  taxNote?: string;
  /** Bought for somebody else: the address that has the files. The buyer's mail then hands nothing over. */
  giftTo?: string;
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

/**
 * `endedKits` leave the shelf with this refund; `keptKits` stay although money went back. `cause`: the workshop gave
 * it back, or the buyer's bank took it back in a dispute. `lines` say what went back for which kit.
 */
export type OrderRefundedMessage = {
  template: 'order-refunded';
  cause?: 'refund' | 'dispute';
  name?: string;
  orderNumber: string;
  receiptNumber: string;
  creditNoteNumber: string;
  amount: Money;
  tax?: TaxLine[];
  lines?: { kit: string; licence: string; amount: Money; endsRight: boolean }[];
  /** It lowered what was paid, and stays used. */
  couponCode?: string;
  endedKits: string[];
  keptKits?: string[];
  /** Bought for somebody else, whose rights these are. */
  giftTo?: string;
  orderLink: string;
};

/**
 * To staff: a buyer's bank asks for the money of an order back, or has decided. `reason` is the payment service's own
 * word; `answerBy` an ISO 8601 instant until which evidence may be handed in there.
 */
export type PaymentDisputedMessage = {
  template: 'payment-disputed';
  name: string;
  orderNumber: string;
  buyer: string;
  stand: 'inquiry' | 'open' | 'won' | 'lost' | 'closed';
  amount: Money;
  reason: string;
  answerBy?: string;
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

/** `from` is the giver; without it the kits come from the workshop itself. `note` is the giver's own words. */
export type GiftReceivedMessage = {
  template: 'gift-received';
  kits: KitTitle[];
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

/** Asks whoever asked for news whether it was them. */
export type ConfirmNewsMessage = { template: 'confirm-news'; link: string; days: number };

/** A letter from the workshop, filled in for one reader. `blocks` hold its words; its maker made them safe. */
export type LetterContent = {
  kind: 'service' | 'news';
  subject: string;
  preheader: string;
  blocks: readonly EmailBlock[];
  /** The kit a service letter is about; without one it is about the shop. */
  kit?: string | undefined;
  accountLink: string;
  stopLink?: string | undefined;
  isTest?: boolean;
};

/** A letter mailed to its writer, to be looked at. */
export type LetterTestMessage = { template: 'letter-test'; content: EmailContent };

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
  | PaymentDisputedMessage
  | StaffInviteMessage
  | RevisionReleasedMessage
  | RevisionWithdrawnMessage
  | GiftReceivedMessage
  | PledgeMessage
  | FitAnsweredMessage
  | FitFixedMessage
  | ConfirmNewsMessage
  | LetterTestMessage;

export type EmailTemplate = EmailMessage['template'];
