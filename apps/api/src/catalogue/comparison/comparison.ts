import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Comparison as ComparisonShape, Handled } from '@windchest/contracts';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { Drafts } from '../revisions/drafts.js';
import { Part } from '../revisions/part.model.js';
import { Revision } from '../revisions/revision.model.js';
import { Differences } from './differences.js';

/** The workshop's comparison of a revision with an earlier one, and the marks the maker puts on it. */
@Injectable()
export class Comparison {
  constructor(
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    @InjectModel(Part) private readonly parts: typeof Part,
    private readonly transactions: Transactions,
    private readonly drafts: Drafts,
    private readonly differences: Differences,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async read(revisionId: string, withId?: string): Promise<ComparisonShape> {
    const revision = await this.revisions.findByPk(revisionId);
    if (!revision) throw notFound('revision');
    const earlier = withId
      ? await this.earlierById(revision, withId)
      : await this.differences.lastReleasedBefore(revision);
    return {
      with: earlier && { id: earlier.id, label: earlier.label },
      rows: await this.differences.rows(earlier, revision),
    };
  }

  async mark(
    person: SignedIn,
    { params, body }: Handled<'PUT /workshop/revisions/:revisionId/marks'>,
  ): Promise<ComparisonShape> {
    await this.transactions.run(async (tx) => {
      const { revision, subject } = await this.drafts.lock(tx, params.revisionId);
      const part = await this.parts.findOne({
        where: { revisionId: revision.id, code: body.code },
        transaction: tx,
      });
      if (!part)
        throw new Refusal('not-found', `There is no part ${body.code} in this revision to put a mark on.`);
      const before = { mark: part.reprintMark, reason: part.reprintReason };
      await part.update(
        { reprintMark: body.mark, reprintReason: body.reason, updatedAt: this.clock.now() },
        { transaction: tx },
      );
      await this.staffLog.record(tx, person, {
        what: `marked part ${part.code}`,
        subject,
        before,
        after: { mark: body.mark, reason: body.reason },
      });
    });
    return this.read(params.revisionId);
  }

  private async earlierById(revision: Revision, id: string): Promise<Revision> {
    const other = await this.revisions.findOne({ where: { id, kitId: revision.kitId } });
    if (!other) throw notFound('revision of this kit');
    const isEarlier =
      other.mark < revision.mark || (other.mark === revision.mark && other.issue < revision.issue);
    if (!isEarlier)
      throw new Refusal(
        'bad-request',
        `${other.label} is not earlier than ${revision.label}. Choose an earlier revision.`,
      );
    return other;
  }
}
