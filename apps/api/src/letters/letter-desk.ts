import { Injectable } from '@nestjs/common';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import { filamentHex } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { labelOf } from './audience.js';
import { LetterComposer, type LetterWords, type ReaderFacts } from './compose-letter.js';
import { LetterMatters, type LetterMatter } from './letter-matter.js';
import { ReprintBooks, type ReprintBook } from './reprint-book.js';

export interface Addressee {
  readonly name: string;
  readonly personId: string | null;
  readonly heldId: string | null;
  /** Of a mailed link to the files, for those without an account. */
  readonly linkId?: string | null;
  /** Of the row that says this address wants news. */
  readonly newsReaderId?: string | null;
}
export interface OpenLetter {
  readonly matter: LetterMatter;
  readonly composer: LetterComposer;
  factsOf(addressee: Addressee): Promise<ReaderFacts>;
}
type LetterToOpen = LetterWords & { readonly kitId: string | null; readonly revisionId: string | null };

/** Lays a letter ready: what it is about, the reprint lists, the links of each reader. */
@Injectable()
export class LetterDesk {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly matters: LetterMatters,
    private readonly books: ReprintBooks,
    private readonly tokens: LinkTokens,
  ) {}

  async open(letter: LetterToOpen): Promise<OpenLetter> {
    const matter = await this.matters.of(letter);
    const { kit, target } = matter;
    const book = target && this.books.open(target.id);
    const composer = new LetterComposer(letter, {
      workshop: {
        name: this.config.WORKSHOP_NAME,
        baseUrl: this.config.BASE_URL,
        address: this.config.WORKSHOP_ADDRESS,
        locale: this.config.WORKSHOP_LOCALE,
      },
      kit: kit && { name: kit.name, slug: kit.slug, colourHex: filamentHex(kit.colour) },
      newest: target?.label ?? '',
    });
    return { matter, composer, factsOf: (addressee) => this.factsOf(addressee, matter, book) };
  }

  stopNewsLink(newsReaderId: string): string {
    return `${this.config.BASE_URL}/unsubscribe/${this.tokens.tokenOf('stop-news', newsReaderId)}`;
  }

  private async factsOf(
    { name, personId, heldId, linkId, newsReaderId }: Addressee,
    matter: LetterMatter,
    book: ReprintBook | null,
  ): Promise<ReaderFacts> {
    const shelf = matter.kit ? `/shelf/${matter.kit.slug}` : '/shelf';
    return {
      name,
      held: labelOf(matter, heldId),
      toPrint: book ? await book.listOf({ personId, heldId }) : [],
      downloadLink: linkId
        ? `${this.config.BASE_URL}/collect/${this.tokens.tokenOf('collect', linkId)}`
        : new URL(shelf, this.config.BASE_URL).href,
      stopLink: newsReaderId ? this.stopNewsLink(newsReaderId) : undefined,
    };
  }
}
