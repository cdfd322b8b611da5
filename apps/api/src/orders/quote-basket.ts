import { Injectable } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { percent, taxFromGross } from '@windchest/money';
import { InjectConfig, type Config } from '../config/config.js';
import { isChargeable } from '../payments/smallest-charge.js';
import type { SignedIn } from '../http/person.js';
import { RateLimits } from '../http/rate-limits.js';
import { Refusal } from '../http/refusal.js';
import { PriceBasket, type PricedBasket } from './price-basket.js';
import { SalesTax, type TaxTerms } from './sales-tax.js';
import { isTaxWithin } from './tax-treatment.js';
import { tooLittleToCharge } from './too-little-to-charge.js';

type Quote = Answer<'POST /basket/quote'>;

/** Prices a basket for its page. A coupon that cannot be used is a fault in the answer, not an error. */
@Injectable()
export class QuoteBasket {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly basket: PriceBasket,
    private readonly taxes: SalesTax,
    private readonly limits: RateLimits,
  ) {}

  async quote(
    { items, couponCode, country, business }: Handled<'POST /basket/quote'>['body'],
    person: SignedIn | null,
    network: string,
  ): Promise<Quote> {
    // Codes can be guessed by trying.
    if (couponCode) await this.limits.take('coupon', network);
    const ids = items.map((item) => item.licenceId);
    const terms = country ? await this.taxes.termsFor(country, business ?? null) : null;
    const buyer = { email: person?.email ?? null, personId: person?.id ?? null };
    try {
      const priced = await this.basket.price(ids, couponCode, buyer, terms);
      if (isChargeable(priced.totalMinor, this.config.WORKSHOP_CURRENCY))
        return this.show(priced, terms, null);
      const { code, detail } = tooLittleToCharge(priced.totalMinor, this.config);
      return this.show(priced, terms, { code, detail });
    } catch (fault) {
      if (!(fault instanceof Refusal) || !fault.code.startsWith('coupon-')) throw fault;
      const full = await this.basket.price(ids, undefined, buyer, terms);
      return this.show(full, terms, { code: fault.code, detail: fault.detail });
    }
  }

  private show(priced: PricedBasket, terms: TaxTerms | null, couponFault: Quote['couponFault']): Quote {
    const money = (minor: number) => ({ minor, currency: this.config.WORKSHOP_CURRENCY });
    const { coupon } = priced;
    return {
      lines: priced.lines.map(({ licence, ...line }) => ({
        licenceId: licence.licenceId,
        kitSlug: licence.kitSlug,
        kitName: licence.kitName,
        colour: licence.colour,
        licenceName: licence.licenceName,
        revision: licence.revisionLabel,
        price: money(line.priceMinor),
        discount: money(line.discountMinor),
        total: money(line.totalMinor),
      })),
      gone: [...priced.gone],
      subtotal: money(priced.subtotalMinor),
      discount: money(priced.discountMinor),
      total: money(priced.totalMinor),
      coupon: coupon && { code: coupon.code, label: coupon.label, cap: coupon.cap, left: coupon.left },
      couponFault,
      tax: terms && priced.totalMinor > 0 ? this.taxOf(priced.totalMinor, terms) : null,
    };
  }

  private taxOf(totalMinor: number, { country, treatment, ratePercent }: TaxTerms): Quote['tax'] {
    const total = { minor: totalMinor, currency: this.config.WORKSHOP_CURRENCY };
    const { net, tax } = taxFromGross(total, percent(isTaxWithin(treatment) ? (ratePercent ?? '0') : '0'));
    return { country, treatment, ratePercent, net, tax };
  }
}
