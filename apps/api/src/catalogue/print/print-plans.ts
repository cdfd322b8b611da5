import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { KitCard, PrintSpecification } from '@windchest/contracts';
import type { PrintProfile } from '@windchest/plates';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { fromJson } from '../json-column.js';
import type { Part } from '../revisions/part.model.js';
import { Revision, type BuildVolume } from '../revisions/revision.model.js';

export type KitEstimate = NonNullable<KitCard['printEstimate']>;

export interface PlannedPart {
  readonly code: string;
  readonly quantity: number;
  readonly orientation: Part['orientation'];
  readonly spec: PrintSpecification;
  readonly heightMm: number;
  /** Convex outline from above, in mm. */
  readonly footprint: readonly (readonly [number, number])[];
  readonly profile: PrintProfile;
}

export interface PrintPlan {
  readonly bed: BuildVolume;
  readonly parts: readonly PlannedPart[];
}

interface Row {
  code: string;
  quantity: number | string;
  orientation: Part['orientation'];
  print_spec: unknown;
  measurement: unknown;
  footprint: unknown;
  print_profile: unknown;
}

/** What the print estimate of a revision is made from, and where it is kept. */
@Injectable()
export class PrintPlans {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
  ) {}

  /** @returns null where a part has no profile, so that no sum would be whole */
  async planOf(revisionId: string): Promise<PrintPlan | null> {
    const revision = await this.revisions.findByPk(revisionId);
    if (!revision) return null;
    const rows = await selectRows<Row>(
      this.database,
      `SELECT p.code, p.quantity, p.orientation, p.print_spec, m.measurement, m.footprint, m.print_profile
       FROM parts p LEFT JOIN revision_files f ON f.id = p.file_id LEFT JOIN measurements m ON m.sha256 = f.sha256
       WHERE p.revision_id = :revisionId ORDER BY p.code`,
      { revisionId },
    );
    const parts = rows.flatMap((row) => {
      const profile = fromJson<PrintProfile>(row.print_profile);
      const footprint = fromJson<[number, number][]>(row.footprint);
      const measured = fromJson<{ sizeMm: [number, number, number] }>(row.measurement);
      if (!profile || !footprint || !measured) return [];
      const spec = fromJson<PrintSpecification>(row.print_spec) ?? revision.printSpec;
      const { code, orientation } = row;
      return [
        {
          code,
          quantity: Number(row.quantity),
          orientation,
          spec,
          heightMm: measured.sizeMm[2],
          footprint,
          profile,
        },
      ];
    });
    return parts.length > 0 && parts.length === rows.length ? { bed: revision.buildVolume, parts } : null;
  }

  async keep(tx: Tx, revisionId: string, estimate: KitEstimate | null): Promise<void> {
    await this.revisions.update({ printEstimate: estimate }, { where: { id: revisionId }, transaction: tx });
  }
}
