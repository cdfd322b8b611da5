import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { KitCard, PrintSpecification } from '@windchest/contracts';
import type { PrintProfile } from '@windchest/plates';
import type { Sequelize } from 'sequelize';
import type { Tx } from '../../database/transactions.js';
import type { Part } from '../revisions/part.model.js';
import { Revision, type BuildVolume } from '../revisions/revision.model.js';
import { printedShapesOf } from './printed-shapes.js';

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
    const shapes = await printedShapesOf(this.database, revisionId);
    const parts = shapes.flatMap(({ code, quantity, orientation, printSpec, sizeMm, footprint, profile }) =>
      profile && footprint && sizeMm
        ? [
            {
              code,
              quantity,
              orientation,
              spec: printSpec ?? revision.printSpec,
              heightMm: sizeMm[2],
              footprint,
              profile,
            },
          ]
        : [],
    );
    return parts.length > 0 && parts.length === shapes.length ? { bed: revision.buildVolume, parts } : null;
  }

  async keep(tx: Tx, revisionId: string, estimate: KitEstimate | null): Promise<void> {
    await this.revisions.update({ printEstimate: estimate }, { where: { id: revisionId }, transaction: tx });
  }
}
