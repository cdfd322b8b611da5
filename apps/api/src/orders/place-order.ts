import { isDeepStrictEqual } from 'node:util';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { consentText, type BusinessBuyer, type Handled } from '@windchest/contracts';
import { Clock } from '../adapters/clock/clock.js';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import { InjectConfig, type Config } from '../config/config.js';
import { Coupons } from '../coupons/coupons.js';
import { isChargeable } from '../payments/smallest-charge.js';
import { newId } from '../database/columns.js';
import { isDuplicate } from '../database/errors.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { Refusal } from '../http/refusal.js';
import { JobQueue } from '../jobs/job-queue.js';
import { businessOf, checkGift } from './check-wishes.js';
import { OrderHistory } from './order-history.js';
import { OrderLine } from './order-line.model.js';
import { newOrderNumber } from './order-number.js';
import { Order } from './order.model.js';
import { payUntil } from '../payments/pay-until.js';
import { PriceBasket, type PricedBasket } from './price-basket.js';
import { FIRST_LOOK_SECONDS, reconcileOrder } from './reconcile-order.job.js';
import { SalesTax, type TaxTerms } from './sales-tax.js';
import { tooLittleToCharge } from './too-little-to-charge.js';

type Body = Handled<'POST /checkout'>['body'];
const NUMBER_TRIES = 5;

/**
 * Writes an order with its lines, its coupon's place, its history and the job that looks after it, in one
 * transaction. The same attempt finds the order it made before.
 */
@Injectable()
export class PlaceOrder {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    @InjectModel(OrderLine) private readonly lines: typeof OrderLine,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly basket: PriceBasket,
    private readonly coupons: Coupons,
    private readonly taxes: SalesTax,
    private readonly history: OrderHistory,
    private readonly jobs: JobQueue,
    private readonly tokens: LinkTokens,
    private readonly clock: Clock,
  ) {}

  async place(body: Body, person: SignedIn | null): Promise<Order> {
    for (let tries = 1; ; tries++) {
      const known = await this.orders.findOne({ where: { attempt: body.attempt } });
      if (known) return this.sameAgain(known, body);
      try {
        return await this.transactions.run((tx) => this.write(tx, body, person), 'read-committed');
      } catch (fault) {
        // Somebody has the number, or the same attempt arrived twice at once.
        const isMended = isDuplicate(fault, 'orders_number') || isDuplicate(fault, 'orders_attempt');
        if (!isMended || tries >= NUMBER_TRIES) throw fault;
      }
    }
  }

  private async sameAgain(order: Order, body: Body): Promise<Order> {
    const lines = await this.lines.findAll({ where: { orderId: order.id } });
    const before = lines.map((line) => line.licenceId).sort();
    const now = [...new Set(body.items.map((item) => item.licenceId))].sort();
    const isSame =
      order.email === body.email &&
      order.declaredCountry === body.country &&
      (order.couponCode ?? '') === (body.couponCode ?? '') &&
      isDeepStrictEqual(order.business, businessOf(body.business, body.country)) &&
      isDeepStrictEqual(order.gift, body.gift ?? null) &&
      before.join() === now.join();
    if (!isSame)
      throw new Refusal(
        'conflict',
        'This checkout was used for another order. Reload the page and go on from there.',
      );
    return order;
  }

  private async write(tx: Tx, body: Body, person: SignedIn | null): Promise<Order> {
    const buyer = { email: body.email, personId: person?.id ?? null };
    const licenceIds = body.items.map((item) => item.licenceId);
    const business = businessOf(body.business, body.country);
    const terms = await this.taxes.termsFor(body.country, business, tx);
    const priced = await this.basket.price(licenceIds, body.couponCode, buyer, terms, tx);
    if (priced.gone.length > 0)
      throw new Refusal(
        'basket-has-gone',
        'Something in the basket is no longer sold. Look at the basket again.',
      );
    if (!isChargeable(priced.totalMinor, this.config.WORKSHOP_CURRENCY))
      throw tooLittleToCharge(priced.totalMinor, this.config);
    checkGift(body.gift, body.email, priced.totalMinor);
    const order = await this.writeOrder(tx, body, person, priced, {
      business,
      // Where nothing is paid there is nothing to tax.
      taxTreatment: priced.totalMinor === 0 ? 'consumer' : terms.treatment,
    });
    await this.history.add(tx, order.id, 'placed', `${priced.lines.length} in the basket`);
    await this.jobs.add(
      tx,
      reconcileOrder,
      { orderId: order.id },
      { key: `reconcile:${order.id}`, runAt: this.clock.in(FIRST_LOOK_SECONDS) },
    );
    // Last, since everybody who wants this coupon waits from here to the commit.
    if (priced.coupon)
      await this.coupons.hold(tx, {
        couponId: priced.coupon.id,
        orderId: order.id,
        ...buyer,
        discountMinor: priced.discountMinor,
      });
    return order;
  }

  private async writeOrder(
    tx: Tx,
    body: Body,
    person: SignedIn | null,
    priced: PricedBasket,
    taxed: { business: BusinessBuyer | null; taxTreatment: TaxTerms['treatment'] },
  ): Promise<Order> {
    const id = newId();
    const now = this.clock.now();
    const order = await this.orders.create(
      {
        id,
        number: newOrderNumber(),
        attempt: body.attempt,
        keyHash: this.tokens.hashOf(this.tokens.tokenOf('order-key', id)),
        personId: person?.id ?? null,
        email: body.email,
        state: 'open',
        currency: this.config.WORKSHOP_CURRENCY,
        subtotalMinor: priced.subtotalMinor,
        discountMinor: priced.discountMinor,
        totalMinor: priced.totalMinor,
        couponId: priced.coupon?.id ?? null,
        couponCode: priced.coupon?.code ?? null,
        declaredCountry: body.country,
        ...taxed,
        gift: body.gift ?? null,
        flags: [],
        consentText,
        consentAt: now,
        payUntil: payUntil(now, this.config.CHECKOUT_MINUTES),
        createdAt: now,
        updatedAt: now,
      },
      { transaction: tx },
    );
    await this.lines.bulkCreate(
      priced.lines.map(({ licence, priceMinor, discountMinor, totalMinor }, position) => ({
        orderId: id,
        position,
        kitId: licence.kitId,
        licenceId: licence.licenceId,
        revisionId: licence.revisionId,
        kitName: licence.kitName,
        licenceName: licence.licenceName,
        revisionLabel: licence.revisionLabel,
        priceMinor,
        discountMinor,
        totalMinor,
      })),
      { transaction: tx },
    );
    return order;
  }
}
