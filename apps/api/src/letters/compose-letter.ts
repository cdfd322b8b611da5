import type { LetterField } from '@windchest/contracts';
import {
  greetedName,
  letterContent,
  reprintBlocks,
  renderContent,
  type EmailBlock,
  type EmailContent,
  type EmailWorkshop,
  type RenderedEmail,
} from '@windchest/emails';
import type { RootContent } from 'mdast';
import { fromMarkdown } from 'mdast-util-from-markdown';
import { gfmFromMarkdown } from 'mdast-util-gfm';
import { gfm } from 'micromark-extension-gfm';
import { fillFields, loneField, withPlainCodes } from './letter-fields.js';
import { blockHtml, type Writing } from './letter-html.js';
import { blockText } from './letter-text.js';
import type { ToPrint } from './reprint-book.js';

export interface LetterWords {
  readonly kind: 'service' | 'news';
  readonly subject: string;
  readonly body: string;
}
/** What is the same for all readers. */
export interface LetterSetting {
  readonly workshop: EmailWorkshop;
  readonly kit: { readonly name: string; readonly slug: string; readonly colourHex: string } | null;
  readonly newest: string;
}
/** What is one reader's own. */
export interface ReaderFacts {
  readonly name: string;
  /** The label of the revision held; null for none. */
  readonly held: string | null;
  readonly toPrint: readonly ToPrint[];
  readonly downloadLink: string;
  /** The page that stops news; for news only. */
  readonly stopLink?: string | undefined;
}

const NOTHING_HELD = 'no revision yet';
const GET_FILES = 'Get the files';

/** A letter read once and filled in for each of its readers. */
export class LetterComposer {
  private readonly blocks: readonly RootContent[];

  constructor(
    private readonly words: LetterWords,
    private readonly setting: LetterSetting,
  ) {
    this.blocks = fromMarkdown(words.body, {
      extensions: [gfm()],
      mdastExtensions: [gfmFromMarkdown()],
    }).children;
  }

  for(reader: ReaderFacts): RenderedEmail {
    return renderContent(this.contentFor(reader), this.setting.workshop);
  }

  contentFor(reader: ReaderFacts, { isTest = false } = {}): EmailContent {
    const values = this.valuesFor(reader);
    const writing = this.writingFor(values);
    const blocks = this.blocks.flatMap((node) => this.blockFor(node, reader, writing));
    const { kind } = this.words;
    return letterContent({
      kind,
      subject: oneLine(fillFields(this.words.subject, (field) => values[field])),
      preheader: this.preheader(writing),
      blocks,
      kit: this.setting.kit?.name,
      accountLink: new URL('/account', this.setting.workshop.baseUrl).href,
      stopLink: kind === 'news' ? reader.stopLink : undefined,
      isTest,
    });
  }

  private valuesFor({ name, held, toPrint, downloadLink }: ReaderFacts): Record<LetterField, string> {
    return {
      name: greetedName(oneLine(name)) ?? '',
      kit: this.setting.kit?.name ?? '',
      held: unbroken(held ?? NOTHING_HELD),
      newest: unbroken(this.setting.newest),
      reprint_list: toPrint.map(({ code, quantity }) => `${code} ×\u00a0${quantity}`).join(', ') || 'nothing',
      download_link: downloadLink,
    };
  }

  private writingFor(values: Record<LetterField, string>): Writing {
    const origin = new URL(this.setting.workshop.baseUrl).origin;
    return {
      fill: (text) => withPlainCodes(fillFields(text, (field) => values[field])),
      linkOf: (address) => {
        if (loneField(decoded(address)) === 'download_link') return values.download_link;
        const link = URL.canParse(address, `${origin}/`) ? new URL(address, `${origin}/`) : null;
        return link && ['https:', 'http:', 'mailto:'].includes(link.protocol) ? link.href : null;
      },
      pictureOf: (address) => {
        const link = URL.canParse(address, `${origin}/`) ? new URL(address, `${origin}/`) : null;
        return link?.protocol === 'https:' && link.origin === origin ? link.href : null;
      },
    };
  }

  /** A list or a link that stands alone becomes a table or a button. */
  private blockFor(node: RootContent, reader: ReaderFacts, writing: Writing): EmailBlock[] {
    const [only] = node.type === 'paragraph' ? node.children : [];
    const alone =
      node.type === 'paragraph' && node.children.length === 1 && only?.type === 'text'
        ? loneField(only.value)
        : null;
    if (alone === 'reprint_list') return reprintBlocks(reader.toPrint, this.setting.kit?.colourHex);
    if (alone === 'download_link') return [{ kind: 'button', label: GET_FILES, link: reader.downloadLink }];
    const text = blockText(node, writing);
    return text === '' ? [] : [{ kind: 'prepared', html: blockHtml(node, writing), text }];
  }

  private preheader(writing: Writing): string {
    const first = this.blocks
      .filter(({ type }) => type === 'paragraph')
      .map((node) => blockText(node, writing));
    // A greeting alone tells nothing in a list of mails.
    const telling = first.find((text) => text.length > 40) ?? first[0] ?? '';
    return oneLine(telling).slice(0, 140);
  }
}

const oneLine = (text: string): string =>
  text.replace(/[\p{Cc}\u2028\u2029\u202a-\u202e\u2066-\u2069]+/gu, ' ').trim();
const unbroken = (label: string): string => label.replaceAll(' ', '\u00a0');
const decoded = (address: string): string => {
  try {
    return decodeURIComponent(address);
  } catch {
    return address;
  }
};
