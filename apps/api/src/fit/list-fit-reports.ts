import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled, WorkshopFitReport } from '@windchest/contracts';
import { Op, type WhereOptions } from 'sequelize';
import { csvRecord } from '../http/csv.js';
import { notFound } from '../http/refusal.js';
import { FitReport } from './fit-report.model.js';
import { ShowFitReport } from './show-reports.js';

type Query = Handled<'GET /workshop/fit-reports'>['query'];
const CSV_PAGE = 200;
const HEAD = [
  'reported_at',
  'kit',
  'revision',
  'part',
  'name',
  'clearance',
  'material',
  'nozzle_mm',
  'layer_mm',
  'printer',
  'verdict',
  'gap_mm',
  'words',
  'state',
  'fixed_in',
  'reporter',
];

/** Reports for the workshop: paged, filtered, as CSV. */
@Injectable()
export class ListFitReports {
  constructor(
    @InjectModel(FitReport) private readonly reports: typeof FitReport,
    private readonly show: ShowFitReport,
  ) {}

  async list(query: Query): Promise<Answer<'GET /workshop/fit-reports'>> {
    const { rows, count } = await this.page(query, query.page, query.size);
    return { items: await this.show.forWorkshop(rows), page: query.page, size: query.size, total: count };
  }

  async one(reportId: string): Promise<WorkshopFitReport> {
    const report = await this.reports.findByPk(reportId);
    if (!report) throw notFound('fit report');
    return this.show.wholeForWorkshop(report);
  }

  countNew(): Promise<number> {
    return this.reports.count({ where: { state: 'new' } });
  }

  async *csv(query: Query): AsyncGenerator<string> {
    yield csvRecord(HEAD);
    for (let page = 1; ; page++) {
      const { rows } = await this.page(query, page, CSV_PAGE);
      for (const one of await this.show.forWorkshop(rows))
        yield csvRecord([
          one.createdAt,
          one.kit.name,
          one.revision,
          one.partCode,
          one.partName,
          one.clearance,
          one.material,
          one.nozzleMm,
          one.layerMm,
          one.printerName,
          one.verdict,
          one.gapMm,
          one.words,
          one.state,
          one.fixedIn?.label ?? null,
          one.reporter.email,
        ]);
      if (rows.length < CSV_PAGE) return;
    }
  }

  private page(query: Query, page: number, size: number): Promise<{ rows: FitReport[]; count: number }> {
    return this.reports.findAndCountAll({
      where: whereOf(query),
      order: [
        ['createdAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: size,
      offset: (page - 1) * size,
    });
  }
}

const whereOf = ({ kitId, state, part, material, search }: Query): WhereOptions => ({
  ...(kitId ? { kitId } : {}),
  ...(state ? { state } : {}),
  ...(part ? { partCode: part } : {}),
  ...(material ? { material } : {}),
  ...(search
    ? {
        [Op.or]: ['words', 'partCode', 'partName', 'printerName'].map((column) => ({
          [column]: { [Op.like]: `%${search}%` },
        })),
      }
    : {}),
});
