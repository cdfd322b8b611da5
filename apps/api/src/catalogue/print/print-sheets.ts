import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Revision } from '../revisions/revision.model.js';
import { printedShapesOf } from './printed-shapes.js';

/** What a browser needs to plan a print: outlines and sums over layers, from which no mesh can be made again. */
@Injectable()
export class PrintSheets {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
  ) {}

  async sheetOf(revisionId: string): Promise<Answer<'GET /kits/:slug/print'>> {
    const [revision, shapes] = await Promise.all([
      this.revisions.findByPk(revisionId, { rejectOnEmpty: true }),
      printedShapesOf(this.database, revisionId),
    ]);
    return {
      revision: revision.label,
      printSpec: revision.printSpec,
      parts: shapes.flatMap(({ sizeMm, ...part }) => {
        if (!sizeMm) return [];
        const [x, y, z] = sizeMm;
        return [{ ...part, sizeMm: { x, y, z }, heightMm: z }];
      }),
      unmeasured: shapes.filter(({ sizeMm }) => !sizeMm).map(({ code }) => code),
    };
  }
}
