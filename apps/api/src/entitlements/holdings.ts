import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Entitlement } from './entitlement.model.js';

export interface Holding {
  readonly kitId: string;
  readonly heldRevisionId: string | null;
}

/** For other rooms: whether somebody has a kit now, and which revision of it. */
@Injectable()
export class Holdings {
  constructor(@InjectModel(Entitlement) private readonly entitlements: typeof Entitlement) {}

  /** @returns null for somebody who has no right to the kit's files at this moment */
  async of(personId: string, kitId: string): Promise<Holding | null> {
    const best = await this.entitlements.findOne({
      where: { personId, kitId, state: 'active' },
      order: [
        ['heldSince', 'DESC'],
        ['createdAt', 'ASC'],
      ],
    });
    return best && { kitId, heldRevisionId: best.heldRevisionId };
  }
}
