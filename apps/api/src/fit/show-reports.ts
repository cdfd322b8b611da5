import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { FitReport as FitReportAnswer, WorkshopFitReport } from '@windchest/contracts';
import { People } from '../accounts/people.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { FitAnswer } from './fit-answer.model.js';
import type { FitReport } from './fit-report.model.js';

/** Reports as their reporters and as the workshop see them. */
@Injectable()
export class ShowFitReport {
  constructor(
    @InjectModel(FitAnswer) private readonly answers: typeof FitAnswer,
    private readonly catalogue: CatalogueReader,
    private readonly people: People,
  ) {}

  async forReporter(reports: readonly FitReport[]): Promise<FitReportAnswer[]> {
    if (reports.length === 0) return [];
    const kits = await this.catalogue.kitsByIds(reports.map(({ kitId }) => kitId));
    const labels = new Map(
      (await Promise.all(kits.map(({ id }) => this.catalogue.revisionChoices(id))))
        .flat()
        .map((revision) => [revision.id, revision]),
    );
    const answers = await this.answers.findAll({
      where: { reportId: reports.map(({ id }) => id) },
      order: [
        ['createdAt', 'ASC'],
        ['id', 'ASC'],
      ],
    });
    return reports.map((report) => {
      const kit = kits.find(({ id }) => id === report.kitId)!;
      const fix = report.fixedInId === null ? undefined : labels.get(report.fixedInId);
      return {
        id: report.id,
        kit: { id: kit.id, slug: kit.slug, name: kit.name, colour: kit.colour },
        revision: labels.get(report.revisionId)?.label ?? '',
        partCode: report.partCode,
        partName: report.partName,
        clearance: report.clearance,
        printerName: report.printerName,
        material: report.material,
        nozzleMm: Number(report.nozzleMm),
        layerMm: Number(report.layerMm),
        verdict: report.verdict,
        gapMm: report.gapMm === null ? null : Number(report.gapMm),
        words: report.words,
        hasPicture: report.pictureSha256 !== null,
        state: report.state,
        fixedIn: fix ? { label: fix.label, isReleased: fix.isReleased } : null,
        createdAt: report.createdAt.toISOString(),
        answers: answers
          .filter(({ reportId }) => reportId === report.id)
          .map(({ createdAt, authorName, text }) => ({ at: createdAt.toISOString(), by: authorName, text })),
      };
    });
  }

  async forWorkshop(reports: readonly FitReport[]): Promise<Omit<WorkshopFitReport, 'mayFixIn'>[]> {
    const shown = await this.forReporter(reports);
    const people = await Promise.all(reports.map(({ personId }) => this.people.byId(personId)));
    return shown.map((one, index) => ({
      ...one,
      reporter: { name: people[index]?.name ?? '', email: people[index]?.email ?? '' },
      revisionId: reports[index]!.revisionId,
      fixedInId: reports[index]!.fixedInId,
    }));
  }

  /** With the revisions that come after the one reported about. */
  async wholeForWorkshop(report: FitReport): Promise<WorkshopFitReport> {
    const [shown] = await this.forWorkshop([report]);
    const choices = await this.catalogue.revisionChoices(report.kitId);
    const at = choices.findIndex(({ id }) => id === report.revisionId);
    return { ...shown!, mayFixIn: at < 0 ? choices : choices.slice(0, at) };
  }
}
