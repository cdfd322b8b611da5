import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled } from '@windchest/contracts';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { newId } from '../../database/columns.js';
import { isDuplicate } from '../../database/errors.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { KitInShopSteps } from './kit-in-shop-steps.js';
import { Kit } from './kit.model.js';

/** Drafting a kit, and changing its words, its colour and whether it stands in the shop. */
@Injectable()
export class DraftKit {
  constructor(
    @InjectModel(Kit) private readonly kits: typeof Kit,
    private readonly transactions: Transactions,
    private readonly staffLog: StaffLog,
    private readonly inShop: KitInShopSteps,
    private readonly clock: Clock,
  ) {}

  async draft(person: SignedIn, { body }: Handled<'POST /workshop/kits'>): Promise<string> {
    const id = newId();
    const now = this.clock.now();
    await naming(body.slug, () =>
      this.transactions.run(async (tx) => {
        await this.kits.create(
          { id, ...body, isListed: false, newestRevisionId: null, createdAt: now, updatedAt: now },
          { transaction: tx },
        );
        await this.staffLog.record(tx, person, { what: 'drafted a kit', subject: body.name, after: body });
      }),
    );
    return id;
  }

  async change(person: SignedIn, { params, body }: Handled<'PATCH /workshop/kits/:kitId'>): Promise<void> {
    await naming(body.slug, () =>
      this.transactions.run(async (tx) => {
        const kit = await this.kits.findByPk(params.kitId, { transaction: tx, lock: tx.LOCK.UPDATE });
        if (!kit) throw notFound('kit');
        const before = Object.fromEntries(Object.keys(body).map((key) => [key, kit.get(key) as unknown]));
        await kit.update({ ...body, updatedAt: this.clock.now() }, { transaction: tx });
        await this.staffLog.record(tx, person, {
          what: whatChanged(body),
          subject: kit.name,
          before,
          after: body,
        });
        if (body.isListed) await this.inShop.run(tx, { kitId: kit.id });
      }),
    );
  }
}

const whatChanged = (body: Handled<'PATCH /workshop/kits/:kitId'>['body']): string =>
  body.isListed === undefined || Object.keys(body).length > 1
    ? 'changed a kit'
    : body.isListed
      ? 'put a kit into the shop'
      : 'took a kit out of the shop';

const naming = async <T>(slug: string | undefined, work: () => Promise<T>): Promise<T> => {
  try {
    return await work();
  } catch (fault) {
    if (!isDuplicate(fault, 'kits_slug')) throw fault;
    throw new Refusal('already-exists', `Another kit has the address “${slug}”. Choose a different one.`, {
      fields: { slug: 'Another kit has this address.' },
    });
  }
};
