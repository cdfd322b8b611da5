import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Coupon as CouponAnswer, Handled } from '@windchest/contracts';
import { StaffLog } from '../accounts/staff-log.js';
import { Clock } from '../adapters/clock/clock.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { newId } from '../database/columns.js';
import { isDuplicate } from '../database/errors.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { CouponKit } from './coupon-kit.model.js';
import { whyRefused } from './coupon-refusals.js';
import { CouponView } from './coupon-view.js';
import { Coupon } from './coupon.model.js';

type Body = Handled<'POST /workshop/coupons'>['body'];

/** Making and changing coupons. */
@Injectable()
export class SaveCoupon {
  constructor(
    @InjectModel(Coupon) private readonly coupons: typeof Coupon,
    @InjectModel(CouponKit) private readonly couponKits: typeof CouponKit,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly catalogue: CatalogueReader,
    private readonly view: CouponView,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async create(by: SignedIn, body: Body): Promise<CouponAnswer> {
    await this.checkKits(body);
    await this.checkTerms(body, null);
    const id = newId();
    const now = this.clock.now();
    await this.unlessTaken(body.code, () =>
      this.transactions.run(async (tx) => {
        await this.coupons.create(
          { id, ...columnsOf(body), held: 0, redeemed: 0, createdAt: now, updatedAt: now },
          { transaction: tx },
        );
        await this.setKits(tx, id, body.kitIds);
        await this.staffLog.record(tx, by, { what: 'made a coupon', subject: body.code, after: body });
      }),
    );
    return this.view.one(id);
  }

  async change(by: SignedIn, couponId: string, body: Body): Promise<CouponAnswer> {
    await this.checkKits(body);
    await this.checkTerms(body, (await this.view.one(couponId)).endsAt);
    await this.unlessTaken(body.code, () =>
      this.transactions.run(async (tx) => {
        // Locked first: nobody takes a place between the look at the cap and the change of it.
        const coupon = await this.coupons.findByPk(couponId, { transaction: tx, lock: tx.LOCK.UPDATE });
        if (!coupon) throw notFound('coupon');
        const taken = coupon.held + coupon.redeemed;
        if (body.cap !== null && body.cap < taken) {
          const sentence = `${taken} places are held or redeemed already. Set the number to ${taken} or more.`;
          throw new Refusal('coupon-refused', sentence, { fields: { cap: sentence } });
        }
        const kits = await this.couponKits.findAll({ where: { couponId }, transaction: tx });
        const before = { ...bodyOf(coupon), kitIds: kits.map((one) => one.kitId) };
        await coupon.update({ ...columnsOf(body), updatedAt: this.clock.now() }, { transaction: tx });
        await this.setKits(tx, couponId, body.kitIds);
        await this.staffLog.record(tx, by, {
          what: 'changed a coupon',
          subject: body.code,
          before,
          after: body,
        });
      }),
    );
    return this.view.one(couponId);
  }

  private async checkKits({ kitIds }: Body): Promise<void> {
    const known = new Set((await this.catalogue.kitsByIds(kitIds)).map((kit) => kit.id));
    if (kitIds.some((id) => !known.has(id)))
      throw new Refusal('coupon-refused', 'One of the kits does not exist any more. Choose the kits again.', {
        fields: { kitIds: 'Choose the kits again.' },
      });
  }

  private async checkTerms(body: Body, endsAtBefore: string | null): Promise<void> {
    const licences = await this.catalogue.allOfferedLicences();
    const refusal = whyRefused(body, {
      now: this.clock.now(),
      currency: this.config.WORKSHOP_CURRENCY,
      locale: this.config.WORKSHOP_LOCALE,
      licences: licences.filter(({ kitId }) => body.kitIds.length === 0 || body.kitIds.includes(kitId)),
      endsAtBefore,
    });
    if (refusal)
      throw new Refusal('coupon-refused', refusal.sentence, {
        fields: { [refusal.field]: refusal.sentence },
      });
  }

  private async setKits(tx: Tx, couponId: string, kitIds: readonly string[]): Promise<void> {
    await this.couponKits.destroy({ where: { couponId }, transaction: tx });
    await this.couponKits.bulkCreate(
      [...new Set(kitIds)].map((kitId) => ({ couponId, kitId })),
      { transaction: tx },
    );
  }

  private async unlessTaken(code: string, work: () => Promise<void>): Promise<void> {
    try {
      await work();
    } catch (fault) {
      if (!isDuplicate(fault, 'coupons_code')) throw fault;
      throw new Refusal('already-exists', `There is a coupon ${code} already. Choose another code.`, {
        fields: { code: 'This code is taken.' },
      });
    }
  }
}

const columnsOf = (body: Body) => ({
  code: body.code,
  label: body.label,
  off: body.off,
  startsAt: body.startsAt === null ? null : new Date(body.startsAt),
  endsAt: body.endsAt === null ? null : new Date(body.endsAt),
  cap: body.cap,
  perBuyer: body.perBuyer,
  isForSupporters: body.isForSupporters,
  minBasketMinor: body.minBasketMinor,
  isAnnounced: body.isAnnounced,
  isActive: body.isActive,
});

const bodyOf = (coupon: Coupon) => ({
  code: coupon.code,
  label: coupon.label,
  off: coupon.off,
  startsAt: coupon.startsAt?.toISOString() ?? null,
  endsAt: coupon.endsAt?.toISOString() ?? null,
  cap: coupon.cap,
  perBuyer: coupon.perBuyer,
  isForSupporters: coupon.isForSupporters,
  minBasketMinor: coupon.minBasketMinor,
  isAnnounced: coupon.isAnnounced,
  isActive: coupon.isActive,
});
