import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled, PostCard } from '@windchest/contracts';
import { CatalogueReader, type KitFacts } from '../catalogue/catalogue-reader.js';
import type { SignedIn } from '../http/person.js';
import { notFound } from '../http/refusal.js';
import { Supporters } from '../supporters/supporters.js';
import { mayReadPost } from './may-read-post.js';
import { Post } from './post.model.js';

/** The journal as visitors, buyers and supporters read it. */
@Injectable()
export class ReadJournal {
  constructor(
    @InjectModel(Post) private readonly posts: typeof Post,
    private readonly catalogue: CatalogueReader,
    private readonly supporters: Supporters,
  ) {}

  async list(person: SignedIn | null, { query }: Handled<'GET /journal'>): Promise<Answer<'GET /journal'>> {
    const { rows, count } = await this.posts.findAndCountAll({
      where: { state: 'published' },
      order: [
        ['publishedAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    const isSupporter = await this.isSupporter(person);
    const kits = await this.kitsOf(rows);
    return {
      items: rows.map((row) => toCard(row, kits, mayReadPost(row, person, isSupporter))),
      page: query.page,
      size: query.size,
      total: count,
    };
  }

  async one(person: SignedIn | null, slug: string): Promise<Answer<'GET /journal/:slug'>> {
    const post = await this.posts.findOne({ where: { slug } });
    if (!post) throw notFound('post');
    const mayRead = mayReadPost(post, person, await this.isSupporter(person));
    if (post.state !== 'published' && !mayRead) throw notFound('post');
    return { ...toCard(post, await this.kitsOf([post]), mayRead), body: mayRead ? post.body : null };
  }

  async isSupporter(person: SignedIn | null): Promise<boolean> {
    return person !== null && (await this.supporters.isCurrent(person.id));
  }

  private async kitsOf(posts: readonly Post[]): Promise<Map<string, KitFacts>> {
    const kits = await this.catalogue.kitsByIds(posts.flatMap(({ kitId }) => kitId ?? []));
    return new Map(kits.map((kit) => [kit.id, kit]));
  }
}

const toCard = (post: Post, kits: Map<string, KitFacts>, mayRead: boolean): PostCard => {
  const kit = post.kitId === null ? undefined : kits.get(post.kitId);
  return {
    slug: post.slug,
    title: post.title,
    lead: post.lead,
    audience: post.audience,
    publishedAt: (post.publishedAt ?? post.updatedAt).toISOString(),
    // A kit that is not out yet is not spoken of outside.
    kit: kit?.newestRevisionId ? { slug: kit.slug, name: kit.name, colour: kit.colour } : null,
    mayRead,
  };
};
