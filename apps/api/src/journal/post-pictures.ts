import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import type { Request, Response } from 'express';
import { Clock } from '../adapters/clock/clock.js';
import { newId } from '../database/columns.js';
import { Transactions } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { Pictures } from '../pictures/pictures.js';
import { mayReadPost } from './may-read-post.js';
import { PostPicture } from './post-picture.model.js';
import { Post } from './post.model.js';
import { ReadJournal } from './read-journal.js';

const MOST_PICTURES = 40;

/** Pictures of posts: sent by those who write, shown to those who may read the post. */
@Injectable()
export class PostPictures {
  constructor(
    @InjectModel(Post) private readonly posts: typeof Post,
    @InjectModel(PostPicture) private readonly rows: typeof PostPicture,
    private readonly pictures: Pictures,
    private readonly transactions: Transactions,
    private readonly journal: ReadJournal,
    private readonly clock: Clock,
  ) {}

  async add(
    postId: string,
    request: Request,
    response: Response,
  ): Promise<Answer<'POST /workshop/posts/:postId/pictures'>> {
    if (!(await this.posts.findByPk(postId))) throw notFound('post');
    const picture = await this.pictures.receive(request, response);
    const id = newId();
    await this.transactions.run(async (tx) => {
      await this.posts.findByPk(postId, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
      if ((await this.rows.count({ where: { postId }, transaction: tx })) >= MOST_PICTURES)
        throw new Refusal('conflict', `A post has room for ${MOST_PICTURES} pictures. Take one out first.`);
      await this.rows.create({ id, postId, ...picture, createdAt: this.clock.now() }, { transaction: tx });
    });
    return { id, fileName: picture.fileName, bytes: picture.bytes };
  }

  async remove(postId: string, pictureId: string): Promise<void> {
    const removed = await this.rows.destroy({ where: { id: pictureId, postId } });
    if (removed === 0) throw notFound('picture');
  }

  async send(person: SignedIn | null, pictureId: string, response: Response): Promise<void> {
    const picture = await this.rows.findByPk(pictureId);
    const post = picture && (await this.posts.findByPk(picture.postId));
    if (!picture || !post || !mayReadPost(post, person, await this.journal.isSupporter(person)))
      throw notFound('picture');
    await this.pictures.send(response, picture, post.audience === 'everybody' && post.state === 'published');
  }
}
