import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled } from '@windchest/contracts';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { newId } from '../../database/columns.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound } from '../../http/refusal.js';
import { Kit } from './kit.model.js';
import { Licence } from './licence.model.js';

/** Offering licences and setting their prices. A licence is never deleted: orders refer to it. */
@Injectable()
export class PriceLicence {
  constructor(
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Licence) private readonly licences: typeof Licence,
    private readonly transactions: Transactions,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async offer(
    person: SignedIn,
    { params, body }: Handled<'POST /workshop/kits/:kitId/licences'>,
  ): Promise<void> {
    await this.transactions.run(async (tx) => {
      const kit = await this.touchKit(tx, params.kitId);
      const now = this.clock.now();
      await this.licences.create(
        { id: newId(), kitId: kit.id, ...body, createdAt: now, updatedAt: now },
        { transaction: tx },
      );
      await this.staffLog.record(tx, person, {
        what: 'offered a licence',
        subject: `${kit.name}: ${body.name}`,
        after: body,
      });
    });
  }

  async change(
    person: SignedIn,
    { params, body }: Handled<'PUT /workshop/kits/:kitId/licences/:licenceId'>,
  ): Promise<void> {
    await this.transactions.run(async (tx) => {
      const kit = await this.touchKit(tx, params.kitId);
      const licence = await this.licences.findOne({
        where: { id: params.licenceId, kitId: kit.id },
        transaction: tx,
      });
      if (!licence) throw notFound('licence');
      const before = Object.fromEntries(Object.keys(body).map((key) => [key, licence.get(key) as unknown]));
      await licence.update({ ...body, updatedAt: this.clock.now() }, { transaction: tx });
      await this.staffLog.record(tx, person, {
        what: 'changed a licence',
        subject: `${kit.name}: ${body.name}`,
        before,
        after: body,
      });
    });
  }

  private async touchKit(tx: Tx, kitId: string): Promise<Kit> {
    const kit = await this.kits.findByPk(kitId, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!kit) throw notFound('kit');
    return kit.update({ updatedAt: this.clock.now() }, { transaction: tx });
  }
}
