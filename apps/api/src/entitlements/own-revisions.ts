import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { CatalogueReader, type ReleasedRevision } from '../catalogue/catalogue-reader.js';
import { Entitlement } from './entitlement.model.js';
import { covers } from './may-download.js';

export interface RevisionsOfPerson {
  readonly all: ReleasedRevision[];
  /** Those that are theirs, newest first. */
  readonly covered: ReleasedRevision[];
  /** The newest of theirs that stands; where none does, the newest that was withdrawn, to say why. */
  readonly newest: ReleasedRevision | null;
  readonly active: Entitlement[];
  /** By whatever right it was fetched. */
  readonly heldRevisionId: string | null;
}

/** A kit's revisions as one person stands to them. */
@Injectable()
export class OwnRevisions {
  constructor(
    @InjectModel(Entitlement) private readonly entitlements: typeof Entitlement,
    private readonly catalogue: CatalogueReader,
  ) {}

  async of(personId: string, kitId: string): Promise<RevisionsOfPerson> {
    const mine = await this.entitlements.findAll({
      where: { personId, kitId },
      order: [['createdAt', 'ASC']],
    });
    const active = mine.filter((one) => one.state === 'active');
    const all = await this.catalogue.revisionsOf(kitId);
    const covered = all.filter(({ releasedAt }) => active.some((one) => covers(one, releasedAt)));
    const [held] = mine
      .filter((one) => one.heldSince !== null)
      .sort((a, b) => (b.heldSince?.getTime() ?? 0) - (a.heldSince?.getTime() ?? 0));
    return {
      all,
      covered,
      newest: covered.find((one) => !one.isWithdrawn) ?? covered[0] ?? null,
      active,
      heldRevisionId: held?.heldRevisionId ?? null,
    };
  }
}
