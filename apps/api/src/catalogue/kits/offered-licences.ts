import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { FilamentColour, Licence } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { labelOf } from '../revisions/revision.model.js';

/** A licence that can be bought now, with its kit and the revision that a buyer gets. */
export interface OfferedLicence {
  readonly licenceId: string;
  readonly licenceName: string;
  readonly licenceKind: Licence['kind'];
  readonly terms: string;
  readonly priceMinor: number;
  readonly kitId: string;
  readonly kitSlug: string;
  readonly kitName: string;
  readonly colour: FilamentColour;
  readonly revisionId: string;
  readonly revisionLabel: string;
}

type Row = Omit<OfferedLicence, 'revisionLabel'> & { mark: number; issue: number };

/** What is on sale: offered licences of listed kits whose newest revision is released. */
@Injectable()
export class OfferedLicences {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  async byIds(licenceIds: readonly string[], tx?: Tx): Promise<OfferedLicence[]> {
    return licenceIds.length === 0 ? [] : this.find('AND l.id IN (:licenceIds)', { licenceIds }, tx);
  }

  all(tx?: Tx): Promise<OfferedLicence[]> {
    return this.find('', {}, tx);
  }

  private async find(
    condition: string,
    values: Record<string, unknown>,
    tx: Tx | undefined,
  ): Promise<OfferedLicence[]> {
    const rows = await selectRows<Row>(
      this.database,
      `SELECT l.id AS licenceId, l.name AS licenceName, l.kind AS licenceKind, l.terms, l.price_minor AS priceMinor,
              k.id AS kitId, k.slug AS kitSlug, k.name AS kitName, k.colour, r.id AS revisionId, r.mark, r.issue
       FROM licences l JOIN kits k ON k.id = l.kit_id JOIN revisions r ON r.id = k.newest_revision_id
       WHERE l.is_offered AND k.is_listed AND r.state = 'released' ${condition}
       ORDER BY k.name, k.id, FIELD(l.kind, 'personal', 'small-run', 'classroom'), l.price_minor, l.id`,
      values,
      tx,
    );
    return rows.map(({ mark, issue, ...row }) => ({
      ...row,
      priceMinor: Number(row.priceMinor),
      revisionLabel: labelOf({ mark, issue }),
    }));
  }
}
