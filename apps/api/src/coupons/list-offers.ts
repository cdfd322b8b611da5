import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import { Op } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { CouponKit } from './coupon-kit.model.js';
import { discountsOf, placesLeft } from './coupon-rules.js';
import { Coupon } from './coupon.model.js';

/**
 * Announced coupons that hold now, with the price of each licence they are for. One whose places are all
 * taken stays in the list with none left: a place held by somebody may come back.
 */
@Injectable()
export class ListOffers {
  constructor(
    @InjectModel(Coupon) private readonly coupons: typeof Coupon,
    @InjectModel(CouponKit) private readonly couponKits: typeof CouponKit,
    @InjectConfig() private readonly config: Config,
    private readonly catalogue: CatalogueReader,
    private readonly clock: Clock,
  ) {}

  async list(): Promise<Answer<'GET /offers'>> {
    const now = this.clock.now();
    const running = await this.coupons.findAll({
      where: {
        isAnnounced: true,
        isActive: true,
        startsAt: { [Op.or]: [null, { [Op.lte]: now }] },
        endsAt: { [Op.or]: [null, { [Op.gt]: now }] },
      },
      order: [['createdAt', 'ASC']],
    });
    if (running.length === 0) return [];
    const pairs = await this.couponKits.findAll({ where: { couponId: running.map((one) => one.id) } });
    const licences = await this.catalogue.allOfferedLicences();
    const currency = this.config.WORKSHOP_CURRENCY;
    return running.flatMap((coupon) => {
      const kitIds = new Set(pairs.filter((pair) => pair.couponId === coupon.id).map((pair) => pair.kitId));
      return (
        licences
          .filter(({ priceMinor, kitId }) => priceMinor > 0 && (kitIds.size === 0 || kitIds.has(kitId)))
          // The price is told of the licence alone, and one that is cheaper than the smallest basket has none.
          .filter(({ priceMinor }) => priceMinor >= (coupon.minBasketMinor ?? 0))
          .map((licence) => {
            const [discount = 0] = discountsOf(coupon.off, [licence], () => true, currency);
            return {
              kitSlug: licence.kitSlug,
              licenceId: licence.licenceId,
              code: coupon.code,
              label: coupon.label,
              price: { minor: licence.priceMinor - discount, currency },
              cap: coupon.cap,
              left: placesLeft(coupon),
              endsAt: coupon.endsAt?.toISOString() ?? null,
            };
          })
      );
    });
  }
}
