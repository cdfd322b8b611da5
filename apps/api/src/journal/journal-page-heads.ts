import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { escapeHtml, PageHeads, type PageHead } from '../http/page-heads.js';
import { Post } from './post.model.js';

const feedTag = (title: string, href: string): string =>
  `<link rel="alternate" type="application/atom+xml" title="${escapeHtml(title)}" href="${escapeHtml(href)}">`;

/** Titles and feed addresses of the journal's pages, for shared links and feed readers. */
@Injectable()
export class JournalPageHeads implements OnModuleInit {
  constructor(
    @InjectModel(Post) private readonly posts: typeof Post,
    private readonly heads: PageHeads,
    private readonly catalogue: CatalogueReader,
  ) {}

  onModuleInit(): void {
    this.heads.register((path) => this.headOf(path));
    this.heads.registerTags((path) => this.kitFeed(path));
  }

  private async headOf(path: string): Promise<PageHead | null> {
    if (/^\/journal\/?$/.test(path))
      return {
        title: 'Journal',
        description: 'News from the bench: what is drawn, printed, proved and mended.',
        extra: feedTag('Journal', '/api/journal.atom'),
      };
    const slug = /^\/journal\/([a-z0-9-]{2,60})\/?$/.exec(path)?.[1];
    const post = slug && (await this.posts.findOne({ where: { slug, state: 'published' } }));
    if (!post) return null;
    return {
      title: post.title,
      description: post.lead || post.title,
      extra: ['<meta property="og:type" content="article">', feedTag('Journal', '/api/journal.atom')].join(
        '\n    ',
      ),
    };
  }

  private async kitFeed(path: string): Promise<string | null> {
    const slug = /^\/kits\/([a-z0-9-]{2,60})\/?$/.exec(path)?.[1];
    const kit = slug ? await this.catalogue.kitBySlug(slug) : null;
    return kit?.newestRevisionId
      ? feedTag(`${kit.name}: revisions`, `/api/kits/${kit.slug}/revisions.atom`)
      : null;
  }
}
