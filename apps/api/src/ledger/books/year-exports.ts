import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled, YearExport } from '@windchest/contracts';
import type { Readable } from 'node:stream';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { Storage } from '../../adapters/storage/storage.js';
import { newId } from '../../database/columns.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { LedgerExport } from './ledger-export.model.js';
import { writeYearExport } from './write-year-export.job.js';

/** Exports of whole years: asked for, listed, fetched. */
@Injectable()
export class YearExports {
  constructor(
    @InjectModel(LedgerExport) private readonly exports: typeof LedgerExport,
    private readonly storage: Storage,
    private readonly transactions: Transactions,
    private readonly jobs: JobQueue,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async ask(year: number, person: SignedIn): Promise<YearExport> {
    const now = this.clock.now();
    if (year > now.getUTCFullYear())
      throw new Refusal('validation-failed', `${year} has not begun.`, {
        fields: { year: 'Choose a year that has begun.' },
      });
    const asked = await this.transactions.run(async (tx) => {
      const one = await this.exports.create(
        {
          id: newId(),
          year,
          state: 'waiting',
          percent: 0,
          askedBy: `${person.name} (${person.role})`,
          createdAt: now,
        },
        { transaction: tx },
      );
      await this.jobs.add(tx, writeYearExport, { exportId: one.id });
      await this.staffLog.record(tx, person, { what: 'asked for an export', subject: String(year) });
      return one;
    });
    return this.one(asked.id);
  }

  async page({
    page,
    size,
  }: Handled<'GET /workshop/ledger/exports'>['query']): Promise<Answer<'GET /workshop/ledger/exports'>> {
    const { rows, count } = await this.exports.findAndCountAll({
      order: [
        ['createdAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: size,
      offset: (page - 1) * size,
    });
    return { items: rows.map(show), page, size, total: count };
  }

  async one(exportId: string): Promise<YearExport> {
    return show(await this.find(exportId));
  }

  async file(exportId: string): Promise<{ fileName: string; bytes: number; stream: Readable }> {
    const found = await this.find(exportId);
    if (!found.storageKey) throw notFound('file of this export yet');
    return {
      fileName: `ledger-${found.year}.zip`,
      bytes: Number(found.bytes),
      stream: await this.storage.get(found.storageKey),
    };
  }

  private async find(exportId: string): Promise<LedgerExport> {
    const found = await this.exports.findByPk(exportId);
    if (!found) throw notFound('export');
    return found;
  }
}

const show = (one: LedgerExport): YearExport => ({
  id: one.id,
  year: one.year,
  state: one.state,
  percent: one.percent,
  bytes: one.bytes === null ? null : Number(one.bytes),
  sha256: one.sha256,
  fault: one.fault,
  askedBy: one.askedBy,
  createdAt: one.createdAt.toISOString(),
  finishedAt: one.finishedAt?.toISOString() ?? null,
});
