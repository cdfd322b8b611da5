import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Revision } from '../revisions/revision.model.js';
import { printedShapesOf, type PrintedShape } from './printed-shapes.js';

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
      parts: shapes.flatMap(({ variants, ...part }) =>
        withBox(part).map((one) => ({ ...one, variants: variants.flatMap(withBox) })),
      ),
      unmeasured: shapes.filter(({ sizeMm }) => !sizeMm).map(({ code }) => code),
    };
  }
}

/** Nothing of a shape that nobody has measured. */
const withBox = <T extends { readonly sizeMm: PrintedShape['sizeMm'] }>({
  sizeMm,
  ...rest
}: T): (Omit<T, 'sizeMm'> & { sizeMm: { x: number; y: number; z: number }; heightMm: number })[] =>
  sizeMm ? [{ ...rest, sizeMm: { x: sizeMm[0], y: sizeMm[1], z: sizeMm[2] }, heightMm: sizeMm[2] }] : [];
