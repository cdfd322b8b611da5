import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { may, type Handled, type WorkshopPost } from '@windchest/contracts';
import { StaffLog } from '../accounts/staff-log.js';
import { Clock } from '../adapters/clock/clock.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { newId } from '../database/columns.js';
import { isDuplicate } from '../database/errors.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { Post } from './post.model.js';
import { ShowPosts } from './show-posts.js';

type Body = Handled<'POST /workshop/posts'>['body'];

/** Drafts, changes, publishes, takes back and deletes posts; each in the staff log. */
@Injectable()
export class WritePosts {
  constructor(
    @InjectModel(Post) private readonly posts: typeof Post,
    private readonly catalogue: CatalogueReader,
    private readonly transactions: Transactions,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
    private readonly show: ShowPosts,
  ) {}

  async draft(person: SignedIn, body: Body): Promise<WorkshopPost> {
    await this.checkKit(body.kitId);
    const id = newId();
    const now = this.clock.now();
    await this.unlessTaken(body.slug, () =>
      this.transactions.run(async (tx) => {
        await this.posts.create(
          { id, ...body, state: 'draft', createdAt: now, updatedAt: now },
          { transaction: tx },
        );
        await this.staffLog.record(tx, person, { what: 'drafted a post', subject: body.title });
      }),
    );
    return this.show.one(id);
  }

  async change(person: SignedIn, postId: string, body: Body): Promise<WorkshopPost> {
    await this.checkKit(body.kitId);
    await this.unlessTaken(body.slug, () =>
      this.inPost(postId, async (tx, post) => {
        if (post.state === 'published' && !may(person.role, 'journal:publish'))
          throw new Refusal('forbidden', 'This post is out. Ask the maker to change it or to take it back.');
        const before = bodyOf(post);
        await post.update({ ...body, updatedAt: this.clock.now() }, { transaction: tx });
        await this.staffLog.record(tx, person, {
          what: 'changed a post',
          subject: body.title,
          before,
          after: body,
        });
      }),
    );
    return this.show.one(postId);
  }

  async publish(person: SignedIn, postId: string): Promise<WorkshopPost> {
    await this.inPost(postId, async (tx, post) => {
      if (post.state === 'published') return;
      if (post.body.trim() === '')
        throw new Refusal('validation-failed', 'The post is empty. Write it first, then publish it.');
      const now = this.clock.now();
      // A post taken back and published again keeps its first date: readers' feeds know it.
      await post.update(
        { state: 'published', publishedAt: post.publishedAt ?? now, updatedAt: now },
        { transaction: tx },
      );
      await this.staffLog.record(tx, person, {
        what: 'published a post',
        subject: post.title,
        after: { audience: post.audience },
      });
    });
    return this.show.one(postId);
  }

  async takeBack(person: SignedIn, postId: string): Promise<WorkshopPost> {
    await this.inPost(postId, async (tx, post) => {
      if (post.state === 'draft') return;
      await post.update({ state: 'draft', updatedAt: this.clock.now() }, { transaction: tx });
      await this.staffLog.record(tx, person, { what: 'took a post back', subject: post.title });
    });
    return this.show.one(postId);
  }

  async delete(person: SignedIn, postId: string): Promise<void> {
    await this.inPost(postId, async (tx, post) => {
      await post.destroy({ transaction: tx });
      await this.staffLog.record(tx, person, {
        what: 'deleted a post',
        subject: post.title,
        before: bodyOf(post),
      });
    });
  }

  private inPost(postId: string, work: (tx: Tx, post: Post) => Promise<void>): Promise<void> {
    return this.transactions.run(async (tx) => {
      const post = await this.posts.findByPk(postId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!post) throw notFound('post');
      await work(tx, post);
    });
  }

  private async checkKit(kitId: string | null): Promise<void> {
    if (kitId !== null && (await this.catalogue.kitsByIds([kitId])).length === 0)
      throw new Refusal('validation-failed', 'The kit this post is about does not exist. Choose it again.', {
        fields: { kitId: 'Choose the kit again.' },
      });
  }

  private async unlessTaken(slug: string, work: () => Promise<void>): Promise<void> {
    try {
      await work();
    } catch (fault) {
      if (!isDuplicate(fault, 'posts_slug')) throw fault;
      throw new Refusal('already-exists', `Another post has the address “${slug}”. Choose another one.`, {
        fields: { slug: 'This address is taken.' },
      });
    }
  }
}

const bodyOf = ({ title, slug, lead, body, audience, kitId }: Post): Body => ({
  title,
  slug,
  lead,
  body,
  audience,
  kitId,
});
