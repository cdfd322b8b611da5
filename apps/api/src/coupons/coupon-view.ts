import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, Coupon as CouponAnswer, CouponDay, Handled } from '@windchest/contracts';
import { Op, type Sequelize, type WhereOptions } from 'sequelize';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { selectRows } from '../database/rows.js';
import { notFound } from '../http/refusal.js';
import { CouponKit } from './coupon-kit.model.js';
import { placesLeft } from './coupon-rules.js';
import { Coupon } from './coupon.model.js';

interface DayRow {
  day: string;
  redeemed: number | string;
  held: number | string;
  givenBack: number | string;
  minor: number | string;
}

/** Coupons as the workshop sees them: with what is held, redeemed and taken off. */
@Injectable()
export class CouponView {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Coupon) private readonly coupons: typeof Coupon,
    @InjectModel(CouponKit) private readonly couponKits: typeof CouponKit,
    @InjectConfig() private readonly config: Config,
    private readonly catalogue: CatalogueReader,
  ) {}

  async list({ query }: Handled<'GET /workshop/coupons'>): Promise<Answer<'GET /workshop/coupons'>> {
    const like = `%${query.search ?? ''}%`;
    const where: WhereOptions = query.search
      ? { [Op.or]: [{ code: { [Op.like]: like } }, { label: { [Op.like]: like } }] }
      : {};
    const { rows, count } = await this.coupons.findAndCountAll({
      where,
      order: [
        ['createdAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    return { items: await this.show(rows), page: query.page, size: query.size, total: count };
  }

  async one(couponId: string): Promise<CouponAnswer> {
    const coupon = await this.coupons.findByPk(couponId);
    const [shown] = coupon ? await this.show([coupon]) : [];
    if (!shown) throw notFound('coupon');
    return shown;
  }

  /** Places by the day they were taken, in UTC, and by what became of them. */
  async uses(couponId: string): Promise<CouponDay[]> {
    await this.one(couponId);
    const rows = await selectRows<DayRow>(
      this.database,
      `SELECT DATE_FORMAT(created_at, '%Y-%m-%d') AS day, SUM(state = 'redeemed') AS redeemed, SUM(state = 'held') AS held,
              SUM(state = 'given-back') AS givenBack, SUM(IF(state = 'redeemed', discount_minor, 0)) AS minor
       FROM coupon_places WHERE coupon_id = :couponId GROUP BY day ORDER BY day`,
      { couponId },
    );
    return rows.map(({ day, redeemed, held, givenBack, minor }) => ({
      day,
      redeemed: Number(redeemed),
      held: Number(held),
      givenBack: Number(givenBack),
      takenOff: { minor: Number(minor), currency: this.config.WORKSHOP_CURRENCY },
    }));
  }

  private async show(coupons: Coupon[]): Promise<CouponAnswer[]> {
    if (coupons.length === 0) return [];
    const ids = coupons.map((coupon) => coupon.id);
    const pairs = await this.couponKits.findAll({ where: { couponId: ids } });
    const kits = await this.catalogue.kitsByIds([...new Set(pairs.map((pair) => pair.kitId))]);
    const sums = await selectRows<{ couponId: string; minor: number | string }>(
      this.database,
      `SELECT coupon_id AS couponId, SUM(discount_minor) AS minor FROM coupon_places
       WHERE coupon_id IN (:ids) AND state = 'redeemed' GROUP BY coupon_id`,
      { ids },
    );
    const takenOff = new Map(sums.map((sum) => [sum.couponId, Number(sum.minor)]));
    const nameOf = new Map(kits.map((kit) => [kit.id, kit.name]));
    const money = (minor: number) => ({ minor, currency: this.config.WORKSHOP_CURRENCY });
    return coupons.map((coupon) => ({
      id: coupon.id,
      code: coupon.code,
      label: coupon.label,
      off: coupon.off,
      kits: pairs
        .filter((pair) => pair.couponId === coupon.id)
        .map(({ kitId }) => ({ id: kitId, name: nameOf.get(kitId) ?? '' })),
      startsAt: coupon.startsAt?.toISOString() ?? null,
      endsAt: coupon.endsAt?.toISOString() ?? null,
      cap: coupon.cap,
      perBuyer: coupon.perBuyer,
      isForSupporters: coupon.isForSupporters,
      minBasket: coupon.minBasketMinor === null ? null : money(coupon.minBasketMinor),
      isAnnounced: coupon.isAnnounced,
      isActive: coupon.isActive,
      held: coupon.held,
      redeemed: coupon.redeemed,
      left: placesLeft(coupon),
      takenOff: money(takenOff.get(coupon.id) ?? 0),
      createdAt: coupon.createdAt.toISOString(),
    }));
  }
}
