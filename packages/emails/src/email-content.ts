/**
 * What a mail says, before it has a form. Both the HTML and the text are written from these blocks, so that
 * neither can say less than the other. All strings are plain text; the writers escape them.
 */
export type EmailBlock =
  | { kind: 'paragraph'; text: string; isSoft?: boolean }
  | { kind: 'button'; label: string; link: string; isSecondary?: boolean }
  /** The link once more as an address to copy, for readers whose buttons do nothing. */
  | { kind: 'pasted-link'; intro: string; link: string }
  | { kind: 'price-table'; rows: PriceRow[]; sums: PriceSum[] }
  | { kind: 'parts-table'; rows: PartRow[]; colourHex?: string }
  | { kind: 'quote'; text: string; by: string }
  | { kind: 'note'; label: string; text: string }
  /** The title block at the foot of a drawing: named fields in ruled cells. One to a mail. */
  | { kind: 'title-block'; cells: TitleCell[] }
  /** Prepared elsewhere, e.g. from a letter's Markdown. The html is NOT escaped: its maker answers for it. */
  | { kind: 'prepared'; html: string; text: string };

export type PriceRow = { title: string; detail: string; amount: string };
export type PriceSum = { label: string; amount: string; isTotal?: boolean; isSoft?: boolean };
export type PartRow = { code: string; name: string; times: string; why: string };
export type TitleCell = { label: string; value: string; link?: string };

export type EmailContent = {
  subject: string;
  /** The line a mail list shows after the subject. */
  preheader: string;
  heading: string;
  blocks: EmailBlock[];
  /** Why this reader gets this mail. */
  reason: string;
  /** Where the reader ends such mails; for those that cannot be ended, where else to go. */
  stop?: { label: string; link: string };
};
