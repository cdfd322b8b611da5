import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Pledge as PledgeAnswer } from '@windchest/contracts';
import { Op } from 'sequelize';
import type { SignedIn } from '../../http/person.js';
import { notFound } from '../../http/refusal.js';
import { PledgeView } from './pledge-view.js';
import { Pledge } from './pledge.model.js';

const PAGE_SIZE = 20;

/** A supporter's own pledges. One that is somebody else's does not exist for them. */
@Injectable()
export class OwnPledges {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    private readonly view: PledgeView,
  ) {}

  /** @throws Refusal `not-found`, alike where there is no such pledge and where it is not theirs */
  async find(pledgeId: string, person: SignedIn): Promise<Pledge> {
    const pledge = await this.pledges.findByPk(pledgeId);
    if (!pledge || pledge.personId !== person.id) throw notFound('pledge');
    return pledge;
  }

  async show(pledgeId: string, person: SignedIn): Promise<PledgeAnswer> {
    return this.view.one(await this.find(pledgeId, person));
  }

  async list(person: SignedIn, page: number): Promise<Answer<'GET /account/pledges'>> {
    const { rows, count } = await this.pledges.findAndCountAll({
      where: {
        personId: person.id,
        [Op.or]: [{ beganAt: { [Op.ne]: null } }, { state: 'opening' }],
      },
      order: [
        ['createdAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: PAGE_SIZE,
      offset: (page - 1) * PAGE_SIZE,
    });
    return { items: await this.view.many(rows), page, size: PAGE_SIZE, total: count };
  }

  async payments(
    pledgeId: string,
    person: SignedIn,
    query: { page: number; size: number },
  ): Promise<Answer<'GET /pledges/:pledgeId/payments'>> {
    await this.find(pledgeId, person);
    return this.view.payments(pledgeId, query);
  }
}
