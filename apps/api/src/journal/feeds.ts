import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { notFound } from '../http/refusal.js';
import { atomDocument } from './atom.js';
import { Post } from './post.model.js';

const NEWEST = 30;
/** What feed readers show beside the title: a line, not the whole notes. */
const SUMMARY_LENGTH = 600;

/** Feeds that tell of new posts and new revisions, without anybody's address. */
@Injectable()
export class Feeds {
  constructor(
    @InjectConfig() private readonly config: Config,
    @InjectModel(Post) private readonly posts: typeof Post,
    private readonly catalogue: CatalogueReader,
  ) {}

  /** Titles and leads of all published posts; what is for supporters is read on its page. */
  async journal(): Promise<string> {
    const posts = await this.posts.findAll({
      where: { state: 'published' },
      order: [
        ['publishedAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: NEWEST,
    });
    return atomDocument({
      id: this.address('/journal'),
      title: `${this.config.WORKSHOP_NAME}: journal`,
      author: this.config.WORKSHOP_NAME,
      self: this.address('/api/journal.atom'),
      page: this.address('/journal'),
      since: new Date(0),
      entries: posts.map((post) => ({
        id: `urn:uuid:${post.id}`,
        title: post.audience === 'supporters' ? `${post.title} (for supporters)` : post.title,
        link: this.address(`/journal/${post.slug}`),
        published: post.publishedAt ?? post.updatedAt,
        updated: post.updatedAt,
        summary: post.lead,
      })),
    });
  }

  async revisionsOf(slug: string): Promise<string> {
    const kit = await this.catalogue.kitBySlug(slug);
    if (!kit?.newestRevisionId) throw notFound('kit');
    const released = (await this.catalogue.revisionsOf(kit.id)).filter((one) => !one.isWithdrawn);
    const page = this.address(`/kits/${kit.slug}`);
    return atomDocument({
      id: `urn:uuid:${kit.id}`,
      title: `${kit.name}: revisions`,
      author: this.config.WORKSHOP_NAME,
      self: this.address(`/api/kits/${kit.slug}/revisions.atom`),
      page,
      since: new Date(0),
      entries: released.slice(0, NEWEST).map((revision) => ({
        id: `urn:uuid:${revision.id}`,
        title: `${kit.name} ${revision.label}`,
        link: page,
        published: revision.releasedAt,
        updated: revision.releasedAt,
        summary: shortened(revision.changeNotes) || 'First release.',
      })),
    });
  }

  private address(path: string): string {
    return new URL(path, this.config.BASE_URL).href;
  }
}

/** Notes without their Markdown signs, cut at a word. */
const shortened = (notes: string): string => {
  const plain = notes
    .replace(/^#+\s*/gm, '')
    .replace(/[*_`[\]]/g, '')
    .replace(/\s+/g, ' ')
    .trim();
  if (plain.length <= SUMMARY_LENGTH) return plain;
  return `${plain.slice(0, SUMMARY_LENGTH).replace(/\s+\S*$/, '')} …`;
};
