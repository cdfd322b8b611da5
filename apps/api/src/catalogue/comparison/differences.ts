import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Clearance, Comparison } from '@windchest/contracts';
import { Op, type Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { ReprintMark } from '../revisions/part.model.js';
import { RevisionContents, type PartOfRevision } from '../revisions/revision-contents.js';
import { labelOf, Revision } from '../revisions/revision.model.js';
import { meshPairsOf } from './compare-parts.js';
import { compareVariants } from './compare-variants.js';
import { netRows, type MarkedStep, type NetRow } from './net-rows.js';
import { MeshComparisons, type Knowledge, type MeshPair } from './mesh-comparisons.js';

type Verdict = { mark: ReprintMark; reasons: string[] };

/** What differs between two revisions of a kit, part by part, with what the maker says to do about it. */
@Injectable()
export class Differences {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    private readonly contents: RevisionContents,
    private readonly meshes: MeshComparisons,
    private readonly transactions: Transactions,
  ) {}

  async rows(from: Revision | null, to: Revision, tx?: Tx): Promise<Comparison['rows']> {
    const before = new Map(
      from ? (await this.contents.partsOf(from.id, tx)).map((part) => [part.code, part]) : [],
    );
    const after = await this.contents.partsOf(to.id, tx);
    const verdicts = from ? await this.verdictsBetween(from, to, tx) : new Map<string, Verdict>();
    const old = (code: string) => before.get(code) ?? null;
    const known = await this.knownOf(
      after.flatMap((part) => meshPairsOf(old(part.code), part)),
      tx,
    );
    const now = after.map((part) => rowOf(old(part.code), part, { verdict: verdicts.get(part.code), known }));
    const codes = new Set(after.map((part) => part.code));
    const gone = [...before.values()].filter((part) => !codes.has(part.code));
    return [...now, ...gone.map((part) => rowOf(part, null, { known }))];
  }

  /** Net, for somebody who prints in this clearance; @returns nothing for a revision that is not there */
  async net(
    fromRevisionId: string | null,
    toRevisionId: string,
    clearance: Clearance | null,
  ): Promise<NetRow[]> {
    const to = await this.revisions.findByPk(toRevisionId);
    if (!to) return [];
    const found = fromRevisionId ? await this.revisions.findByPk(fromRevisionId) : null;
    const from = found?.kitId === to.kitId ? found : null;
    const [before, after, steps] = await Promise.all([
      from && this.contents.partsOf(from.id),
      this.contents.partsOf(to.id),
      from ? this.stepsBetween(from, to) : [],
    ]);
    const old = new Map((before ?? []).map((part) => [part.code, part]));
    const known = await this.knownOf(after.flatMap((part) => meshPairsOf(old.get(part.code) ?? null, part)));
    return netRows({ before, after, steps, clearance, known });
  }

  /** What buyers hold now: the newest revision before this one that was released. */
  lastReleasedBefore(revision: Revision, tx?: Tx): Promise<Revision | null> {
    const { kitId, mark, issue } = revision;
    return this.revisions.findOne({
      where: {
        kitId,
        state: { [Op.in]: ['released', 'withdrawn'] },
        [Op.or]: [{ mark: { [Op.lt]: mark } }, { mark, issue: { [Op.lt]: issue } }],
      },
      order: [
        ['mark', 'DESC'],
        ['issue', 'DESC'],
      ],
      transaction: tx ?? null,
    });
  }

  /** What nobody has asked about so far is compared from now on. */
  private async knownOf(pairs: readonly MeshPair[], tx?: Tx): Promise<Knowledge> {
    const { of, unasked } = await this.meshes.known(pairs, tx);
    if (tx) await this.meshes.want(tx, unasked);
    else if (unasked.length > 0) await this.transactions.run((own) => this.meshes.want(own, unasked));
    return of;
  }

  /**
   * The maker marks a part against the revision before. Over several revisions the strongest of the marks
   * since the held one counts, with every reason, newest first.
   */
  private async verdictsBetween(from: Revision, to: Revision, tx?: Tx): Promise<Map<string, Verdict>> {
    const verdicts = new Map<string, Verdict>();
    for (const { code, mark, reason } of await this.stepsBetween(from, to, tx)) {
      const known = verdicts.get(code) ?? { mark, reasons: [] };
      if (mark === 'reprint needed') known.mark = mark;
      if (reason !== '' && !known.reasons.includes(reason)) known.reasons.push(reason);
      verdicts.set(code, known);
    }
    return verdicts;
  }

  /** Marks of the revisions after the older one up to the newer, newest first: back is as far as forth. */
  private async stepsBetween(from: Revision, to: Revision, tx?: Tx): Promise<MarkedStep[]> {
    const [older, newer] = isNewer(from, to) ? [to, from] : [from, to];
    const rows = await selectRows<MarkedStep & { in_mark: number; in_issue: number }>(
      this.database,
      `SELECT p.code, p.reprint_mark AS mark, p.reprint_reason AS reason, r.mark AS in_mark, r.issue AS in_issue
       FROM parts p JOIN revisions r ON r.id = p.revision_id
       WHERE r.kit_id = :kitId AND p.reprint_mark IS NOT NULL
         AND (r.id = :toId OR r.state IN ('released', 'withdrawn'))
         AND (r.mark > :fromMark OR (r.mark = :fromMark AND r.issue > :fromIssue))
         AND (r.mark < :toMark OR (r.mark = :toMark AND r.issue <= :toIssue))
       ORDER BY r.mark DESC, r.issue DESC`,
      {
        kitId: to.kitId,
        toId: newer.id,
        fromMark: older.mark,
        fromIssue: older.issue,
        toMark: newer.mark,
        toIssue: newer.issue,
      },
      tx,
    );
    return rows.map(({ code, mark, reason, in_mark, in_issue }) => ({
      code,
      revision: labelOf({ mark: in_mark, issue: in_issue }),
      mark,
      reason,
    }));
  }
}

const isNewer = (one: Revision, other: Revision): boolean =>
  one.mark > other.mark || (one.mark === other.mark && one.issue > other.issue);

/** By what a pair is judged: the maker's word, and what is known of the meshes. */
interface Judging {
  readonly verdict?: Verdict | undefined;
  readonly known: Knowledge;
}

const rowOf = (
  before: PartOfRevision | null,
  after: PartOfRevision | null,
  { verdict, known }: Judging,
): Comparison['rows'][number] => {
  const part = (after ?? before)!;
  const difference = compareVariants(before, after, known);
  const counts = difference.difference === 'changed' && verdict !== undefined;
  return {
    code: part.code,
    name: part.name,
    quantity: part.quantity,
    ...difference,
    mark: counts ? verdict.mark : null,
    reason: counts ? verdict.reasons.join(' · ') : '',
  };
};
