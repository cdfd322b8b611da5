import { Injectable } from '@nestjs/common';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { Coupons, type CouponBuyer, type PricedCoupon } from '../coupons/coupons.js';
import type { Tx } from '../database/transactions.js';
import type { TaxTerms } from './sales-tax.js';

type OfferedLicence = Awaited<ReturnType<CatalogueReader['offeredLicences']>>[number];

export interface PricedLine {
  readonly licence: OfferedLicence;
  readonly priceMinor: number;
  readonly discountMinor: number;
  readonly totalMinor: number;
}

export interface PricedBasket {
  readonly lines: readonly PricedLine[];
  /** Licences asked for that are no longer sold. */
  readonly gone: readonly string[];
  readonly coupon: PricedCoupon | null;
  readonly subtotalMinor: number;
  readonly discountMinor: number;
  readonly totalMinor: number;
}

/** What a basket costs now. A quote and an order are priced by this same code. */
@Injectable()
export class PriceBasket {
  constructor(
    private readonly catalogue: CatalogueReader,
    private readonly coupons: Coupons,
  ) {}

  /**
   * @param terms what the buyer's country and business make of the prices; without them they stand as shown
   * @throws Refusal with a `coupon-…` code where the coupon cannot be used
   */
  async price(
    licenceIds: readonly string[],
    couponCode: string | undefined,
    buyer: CouponBuyer,
    terms: Pick<TaxTerms, 'chargedOf'> | null,
    tx?: Tx,
  ): Promise<PricedBasket> {
    // Files are bought once: a licence that stands in the basket twice is one line.
    const wanted = [...new Set(licenceIds)];
    const offered = wanted.length === 0 ? [] : await this.catalogue.offeredLicences(wanted, tx);
    const found = new Map(offered.map((licence) => [licence.licenceId, licence]));
    const licences = wanted.flatMap((id) => found.get(id) ?? []);
    const chargedOf = terms?.chargedOf ?? ((priceMinor: number) => priceMinor);
    const coupon =
      couponCode && licences.length > 0
        ? await this.coupons.priceFor(couponCode, licences, buyer, { chargedOf, tx })
        : null;
    const lines = licences.map((licence, index) => {
      const priceMinor = chargedOf(licence.priceMinor);
      const discountMinor = coupon?.discounts[index] ?? 0;
      return { licence, priceMinor, discountMinor, totalMinor: priceMinor - discountMinor };
    });
    return {
      lines,
      gone: wanted.filter((id) => !found.has(id)),
      coupon,
      subtotalMinor: total(lines.map((line) => line.priceMinor)),
      discountMinor: total(lines.map((line) => line.discountMinor)),
      totalMinor: total(lines.map((line) => line.totalMinor)),
    };
  }
}

const total = (minors: readonly number[]): number => minors.reduce((sum, minor) => sum + minor, 0);
