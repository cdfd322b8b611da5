import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, FitReport as FitReportAnswer, Handled } from '@windchest/contracts';
import type { Request, Response } from 'express';
import { Clock } from '../adapters/clock/clock.js';
import { CatalogueReader, type KitFacts } from '../catalogue/catalogue-reader.js';
import { newId } from '../database/columns.js';
import { Holdings } from '../entitlements/holdings.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { Pictures } from '../pictures/pictures.js';
import { FitReport } from './fit-report.model.js';
import { ShowFitReport } from './show-reports.js';

type Body = Handled<'POST /shelf/:slug/fit-reports'>['body'];

/** A buyer's word on how a part fits: given for a kit on the shelf, read again by its reporter. */
@Injectable()
export class ReportFit {
  constructor(
    @InjectModel(FitReport) private readonly reports: typeof FitReport,
    private readonly holdings: Holdings,
    private readonly catalogue: CatalogueReader,
    private readonly pictures: Pictures,
    private readonly show: ShowFitReport,
    private readonly clock: Clock,
  ) {}

  async report(person: SignedIn, slug: string, body: Body): Promise<FitReportAnswer> {
    const kit = await this.kitOf(person, slug);
    const part = await this.partOf(kit, body);
    const now = this.clock.now();
    const report = await this.reports.create({
      ...body,
      id: newId(),
      kitId: kit.id,
      partName: part.name,
      personId: person.id,
      state: 'new',
      createdAt: now,
      updatedAt: now,
    });
    return this.one(report);
  }

  async list(
    person: SignedIn,
    { params, query }: Handled<'GET /shelf/:slug/fit-reports'>,
  ): Promise<Answer<'GET /shelf/:slug/fit-reports'>> {
    const kit = await this.catalogue.kitBySlug(params.slug);
    if (!kit) throw notFound('kit on your shelf');
    const { rows, count } = await this.reports.findAndCountAll({
      where: { personId: person.id, kitId: kit.id },
      order: [
        ['createdAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    return {
      items: await this.show.forReporter(rows),
      page: query.page,
      size: query.size,
      total: count,
    };
  }

  async addPicture(
    person: SignedIn,
    reportId: string,
    request: Request,
    response: Response,
  ): Promise<FitReportAnswer> {
    const report = await this.reports.findOne({ where: { id: reportId, personId: person.id } });
    if (!report) throw notFound('report of yours');
    const { sha256, contentType, bytes } = await this.pictures.receive(request, response);
    await report.update({
      pictureSha256: sha256,
      pictureType: contentType,
      pictureBytes: bytes,
      updatedAt: this.clock.now(),
    });
    return this.one(report);
  }

  private async one(report: FitReport): Promise<FitReportAnswer> {
    const [shown] = await this.show.forReporter([report]);
    return shown!;
  }

  private async kitOf(person: SignedIn, slug: string): Promise<KitFacts> {
    const kit = await this.catalogue.kitBySlug(slug);
    if (!kit || !(await this.holdings.of(person.id, kit.id))) throw notFound('kit on your shelf');
    return kit;
  }

  private async partOf(kit: KitFacts, { revisionId, partCode }: Body): Promise<{ name: string }> {
    const revision = await this.catalogue.revisionById(revisionId);
    if (!revision || revision.kitId !== kit.id) throw notFound('revision of this kit');
    const parts = await this.catalogue.netDifferences(null, revision.id, null);
    const part = parts.find(({ code }) => code === partCode);
    if (!part)
      throw new Refusal('validation-failed', `${kit.name} ${revision.label} has no part ${partCode}.`, {
        fields: { partCode: `There is no ${partCode} in ${revision.label}. Choose another part.` },
      });
    return part;
  }
}
