import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled, WorkshopFitReport } from '@windchest/contracts';
import { People } from '../accounts/people.js';
import { StaffLog } from '../accounts/staff-log.js';
import { Clock } from '../adapters/clock/clock.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { RevisionReleasedSteps } from '../catalogue/release/revision-released-steps.js';
import { newId } from '../database/columns.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { FitAnswer } from './fit-answer.model.js';
import { FitMails } from './fit-mails.js';
import { FitReport } from './fit-report.model.js';
import { ListFitReports } from './list-fit-reports.js';

/** Answering reports, naming the revision that mends them, closing them; reporters hear of each. */
@Injectable()
export class AnswerFit implements OnModuleInit {
  constructor(
    @InjectModel(FitReport) private readonly reports: typeof FitReport,
    @InjectModel(FitAnswer) private readonly answers: typeof FitAnswer,
    private readonly transactions: Transactions,
    private readonly catalogue: CatalogueReader,
    private readonly people: People,
    private readonly mails: FitMails,
    private readonly released: RevisionReleasedSteps,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
    private readonly list: ListFitReports,
  ) {}

  onModuleInit(): void {
    this.released.register({
      name: 'fit-reports',
      order: 40,
      run: async (tx, { revisionId }) => {
        const waiting = await this.reports.findAll({
          where: { fixedInId: revisionId, state: 'planned' },
          transaction: tx,
          lock: tx.LOCK.UPDATE,
        });
        for (const report of waiting) await this.setFixed(tx, report);
      },
    });
  }

  async answer(person: SignedIn, reportId: string, text: string): Promise<WorkshopFitReport> {
    await this.inReport(reportId, async (tx, report) => {
      const now = this.clock.now();
      const id = newId();
      await this.answers.create(
        { id, reportId, authorId: person.id, authorName: person.name, text, createdAt: now },
        { transaction: tx },
      );
      await report.update(
        { state: report.state === 'new' ? 'answered' : report.state, updatedAt: now },
        { transaction: tx },
      );
      const reporter = await this.people.byId(report.personId, tx);
      if (reporter) await this.mails.answered(tx, reporter, report, { id, by: person.name, text });
      await this.staffLog.record(tx, person, {
        what: 'answered a fit report',
        subject: subjectOf(report),
        after: { text },
      });
    });
    return this.list.one(reportId);
  }

  /** Names the revision that mends these reports; where it is out already their reporters hear at once. */
  fix(
    person: SignedIn,
    { reportIds, revisionId }: Handled<'POST /workshop/fit-fixes'>['body'],
  ): Promise<number> {
    return this.transactions.run(async (tx) => {
      const reports = await this.reports.findAll({
        where: { id: [...new Set(reportIds)] },
        order: [['id', 'ASC']],
        transaction: tx,
        lock: tx.LOCK.UPDATE,
      });
      if (reports.length === 0) throw notFound('fit report');
      for (const report of reports) {
        const choices = await this.catalogue.revisionChoices(report.kitId);
        const fix = choices.find(({ id }) => id === revisionId);
        if (!fix || choices.findIndex(({ id }) => id === report.revisionId) <= choices.indexOf(fix))
          throw new Refusal(
            'conflict',
            `A report about ${report.partCode} of ${choices.find(({ id }) => id === report.revisionId)?.label ?? 'another kit'} can only be mended by a later revision of the same kit.`,
          );
        await report.update(
          { fixedInId: revisionId, state: 'planned', updatedAt: this.clock.now() },
          { transaction: tx },
        );
        if (fix.isReleased) await this.setFixed(tx, report);
        await this.staffLog.record(tx, person, {
          what: 'named the revision that mends a fit report',
          subject: subjectOf(report),
          after: { revision: fix.label },
        });
      }
      return reports.length;
    });
  }

  async close(person: SignedIn, reportId: string): Promise<WorkshopFitReport> {
    await this.inReport(reportId, async (tx, report) => {
      await report.update({ state: 'closed', updatedAt: this.clock.now() }, { transaction: tx });
      await this.staffLog.record(tx, person, { what: 'closed a fit report', subject: subjectOf(report) });
    });
    return this.list.one(reportId);
  }

  private async setFixed(tx: Tx, report: FitReport): Promise<void> {
    await report.update({ state: 'fixed', updatedAt: this.clock.now() }, { transaction: tx });
    const reporter = await this.people.byId(report.personId, tx);
    if (reporter) await this.mails.fixed(tx, reporter, report);
  }

  private inReport(reportId: string, work: (tx: Tx, report: FitReport) => Promise<void>): Promise<void> {
    return this.transactions.run(async (tx) => {
      const report = await this.reports.findByPk(reportId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!report) throw notFound('fit report');
      await work(tx, report);
    });
  }
}

const subjectOf = ({ partCode, partName }: FitReport): string => `${partCode} ${partName}`;
