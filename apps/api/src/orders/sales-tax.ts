import { Injectable } from '@nestjs/common';
import type { ProductKind, TaxTreatment } from '@windchest/contracts';
import { Clock } from '../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../config/config.js';
import type { Tx } from '../database/transactions.js';
import { chargedPrice, taxTreatmentOf } from './tax-treatment.js';

/** In percent as decimal text; null where nobody has entered a rate. */
type RateOf = (country: string, kind: ProductKind, on: Date, tx?: Tx) => Promise<string | null>;

/** What a buyer's country and business make of a price. */
export interface TaxTerms {
  readonly country: string;
  readonly treatment: TaxTreatment;
  readonly ratePercent: string | null;
  /** In minor units. */
  readonly chargedOf: (priceMinor: number) => number;
}

/** Taxes as checkouts need them. The rates are the ledger's; it registers their source at start-up. */
@Injectable()
export class SalesTax {
  private rateOf: RateOf = () => Promise.resolve(null);

  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly clock: Clock,
  ) {}

  registerRates(rateOf: RateOf): void {
    this.rateOf = rateOf;
  }

  async termsFor(
    country: string,
    business: { readonly vatNumber: string } | null,
    tx?: Tx,
  ): Promise<TaxTerms> {
    const treatment = taxTreatmentOf(this.config.WORKSHOP_COUNTRY, country, business);
    const ratePercent = await this.rateOf(country, 'electronic-service', this.clock.now(), tx);
    const currency = this.config.WORKSHOP_CURRENCY;
    return {
      country,
      treatment,
      ratePercent,
      chargedOf: (priceMinor) => chargedPrice(priceMinor, { treatment, ratePercent, currency }),
    };
  }
}
