import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { CouponOff } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../config/config.js';
import { newId } from '../database/columns.js';
import { touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { Refusal } from '../http/refusal.js';
import { CouponBuyers, type CouponBuyer } from './coupon-buyers.js';
import { CouponKit } from './coupon-kit.model.js';
import {
  discountsOf,
  faultOf,
  placesLeft,
  tooSmallBasket,
  unknownCoupon,
  usedUp,
  type CouponFault,
} from './coupon-rules.js';
import { Coupon } from './coupon.model.js';

export type { CouponBuyer } from './coupon-buyers.js';

export interface PricedCoupon {
  readonly id: string;
  readonly code: string;
  readonly label: string;
  readonly cap: number | null;
  readonly left: number | null;
  /** In minor units, in the order of the lines. */
  readonly discounts: readonly number[];
}

export interface HoldRequest {
  readonly couponId: string;
  readonly orderId: string;
  readonly email: string;
  readonly personId: string | null;
  readonly discountMinor: number;
}

/**
 * Coupons as orders use them. A place goes from held to redeemed or is given back, once: the state of its
 * row decides, so whatever runs twice does nothing the second time.
 */
@Injectable()
export class Coupons {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Coupon) private readonly coupons: typeof Coupon,
    @InjectModel(CouponKit) private readonly couponKits: typeof CouponKit,
    @InjectConfig() private readonly config: Config,
    private readonly buyers: CouponBuyers,
    private readonly clock: Clock,
  ) {}

  /**
   * @param lines at the shop's own prices
   * @param options `chargedOf`: what a price of the shop comes to for this buyer, less a tax that is not charged
   * @throws Refusal with a `coupon-…` code where the coupon cannot be used for these lines by this buyer
   */
  async priceFor(
    code: string,
    lines: readonly { readonly kitId: string; readonly priceMinor: number }[],
    buyer: CouponBuyer,
    { chargedOf, tx }: { chargedOf: (priceMinor: number) => number; tx: Tx | undefined },
  ): Promise<PricedCoupon> {
    const coupon = await this.coupons.findOne({ where: { code }, transaction: tx ?? null });
    if (!coupon) throw refusalOf(unknownCoupon(code));
    const fault = faultOf(coupon, this.clock.now());
    if (fault) throw refusalOf(fault);
    const kits = await this.couponKits.findAll({ where: { couponId: coupon.id }, transaction: tx ?? null });
    const kitIds = new Set(kits.map((one) => one.kitId));
    const isForKit = (kitId: string): boolean => kitIds.size === 0 || kitIds.has(kitId);
    if (!lines.some((line) => isForKit(line.kitId)))
      throw new Refusal('coupon-does-not-apply', `The coupon ${coupon.code} is for other kits.`);
    await this.buyers.check(coupon, buyer, tx);
    const short = tooSmallBasket(coupon, sumOf(lines), {
      currency: this.config.WORKSHOP_CURRENCY,
      locale: this.config.WORKSHOP_LOCALE,
    });
    if (short) throw refusalOf(short);
    return {
      id: coupon.id,
      code: coupon.code,
      label: coupon.label,
      cap: coupon.cap,
      left: placesLeft(coupon),
      discounts: discountsOf(
        chargedOff(coupon.off, chargedOf),
        lines.map(({ kitId, priceMinor }) => ({ kitId, priceMinor: chargedOf(priceMinor) })),
        isForKit,
        this.config.WORKSHOP_CURRENCY,
      ),
    };
  }

  /**
   * Takes a place for an order. One conditional update decides, so that however many arrive at once, no
   * more than the cap get in; its row lock then makes the count of the buyer's own places exact.
   * Best called late in a transaction at `read-committed`: all who want this coupon wait for that lock.
   * @throws Refusal `coupon-is-used-up` and the like
   */
  async hold(tx: Tx, { couponId, orderId, email, personId, discountMinor }: HoldRequest): Promise<void> {
    const now = this.clock.now();
    const taken = await touchRows(
      this.database,
      `UPDATE coupons SET held = held + 1
       WHERE id = :couponId AND is_active AND (starts_at IS NULL OR starts_at <= :now)
         AND (ends_at IS NULL OR ends_at > :now) AND (cap IS NULL OR held + redeemed < cap)`,
      { couponId, now },
      tx,
    );
    const coupon = await this.coupons.findByPk(couponId, { transaction: tx });
    if (!coupon) throw new Error('An order was priced with a coupon that does not exist.');
    if (taken !== 1) throw refusalOf(faultOf(coupon, now) ?? usedUp(coupon));
    await this.buyers.check(coupon, { email, personId }, tx);
    const accountId = await this.buyers.accountOf({ email, personId }, tx);
    await touchRows(
      this.database,
      `INSERT INTO coupon_places (id, coupon_id, order_id, email, person_id, discount_minor, created_at, updated_at)
       VALUES (:id, :couponId, :orderId, :email, :accountId, :discountMinor, :now, :now)`,
      { id: newId(), couponId, orderId, email, accountId, discountMinor, now },
      tx,
    );
  }

  /** The order is paid: its place is used for good. */
  async redeem(tx: Tx, orderId: string): Promise<void> {
    await this.leaveHold(tx, orderId, 'redeemed');
  }

  /** The order came to nothing: its place is free for somebody else. */
  async giveBack(tx: Tx, orderId: string): Promise<void> {
    await this.leaveHold(tx, orderId, 'given-back');
  }

  private async leaveHold(tx: Tx, orderId: string, state: 'redeemed' | 'given-back'): Promise<void> {
    const left = await touchRows(
      this.database,
      `UPDATE coupon_places SET state = :state, updated_at = :now WHERE order_id = :orderId AND state = 'held'`,
      { state, orderId, now: this.clock.now() },
      tx,
    );
    if (left !== 1) return;
    await touchRows(
      this.database,
      `UPDATE coupons SET held = held - 1, redeemed = redeemed + :redeemed
       WHERE id = (SELECT coupon_id FROM coupon_places WHERE order_id = :orderId)`,
      { redeemed: state === 'redeemed' ? 1 : 0, orderId },
      tx,
    );
  }
}

/** An amount contains the same tax as the prices it is taken off. */
const chargedOff = (off: CouponOff, chargedOf: (minor: number) => number): CouponOff =>
  off.kind === 'amount' ? { kind: 'amount', minor: chargedOf(off.minor) } : off;

const refusalOf = ({ code, detail }: CouponFault): Refusal => new Refusal(code, detail);
const sumOf = (lines: readonly { readonly priceMinor: number }[]): number =>
  lines.reduce((sum, line) => sum + line.priceMinor, 0);
