import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled, WorkshopPost } from '@windchest/contracts';
import { Op, type WhereOptions } from 'sequelize';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { notFound } from '../http/refusal.js';
import { PostPicture } from './post-picture.model.js';
import { Post } from './post.model.js';

/** Posts as the workshop sees them. */
@Injectable()
export class ShowPosts {
  constructor(
    @InjectModel(Post) private readonly posts: typeof Post,
    @InjectModel(PostPicture) private readonly pictures: typeof PostPicture,
    private readonly catalogue: CatalogueReader,
  ) {}

  async list({ query }: Handled<'GET /workshop/posts'>): Promise<Answer<'GET /workshop/posts'>> {
    const like = `%${query.search ?? ''}%`;
    const where: WhereOptions = query.search
      ? { [Op.or]: [{ title: { [Op.like]: like } }, { slug: { [Op.like]: like } }] }
      : {};
    const { rows, count } = await this.posts.findAndCountAll({
      where,
      order: [
        ['updatedAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    const names = await this.kitNames(rows);
    return {
      items: rows.map((row) => toRow(row, names)),
      page: query.page,
      size: query.size,
      total: count,
    };
  }

  async one(postId: string): Promise<WorkshopPost> {
    const post = await this.posts.findByPk(postId);
    if (!post) throw notFound('post');
    const pictures = await this.pictures.findAll({ where: { postId }, order: [['createdAt', 'ASC']] });
    return {
      ...toRow(post, await this.kitNames([post])),
      lead: post.lead,
      body: post.body,
      kitId: post.kitId,
      pictures: pictures.map(({ id, fileName, bytes }) => ({ id, fileName, bytes })),
    };
  }

  private async kitNames(posts: readonly Post[]): Promise<Map<string, string>> {
    const kits = await this.catalogue.kitsByIds(posts.flatMap(({ kitId }) => kitId ?? []));
    return new Map(kits.map(({ id, name }) => [id, name]));
  }
}

const toRow = (
  post: Post,
  kitNames: Map<string, string>,
): Answer<'GET /workshop/posts'>['items'][number] => ({
  id: post.id,
  slug: post.slug,
  title: post.title,
  audience: post.audience,
  state: post.state,
  kitName: post.kitId === null ? null : (kitNames.get(post.kitId) ?? null),
  publishedAt: post.publishedAt?.toISOString() ?? null,
  updatedAt: post.updatedAt.toISOString(),
});
