import { plannedKits, type PlannedCoupon, type PlannedOrder } from './year-plan.js';

/*
 * What a year should come to, reckoned by itself: nothing here is taken from the rooms or from the money package, so
 * that the two can only agree by both being right.
 */

/** In thousandths, for the countries of the plan; those left out are sold to without a tax. */
const rates: Readonly<Record<string, number>> = { DE: 190, FR: 200, IT: 220, FI: 255, AT: 200, IE: 230 };
const SELLER = 'IE';

const halfUp = (over: number, under: number): number => Math.floor((2 * over + under) / (2 * under));
const netOf = (gross: number, thousandths: number): number => halfUp(gross * 1000, 1000 + thousandths);

export type Right = 'active' | 'suspended' | 'ended';
export interface ModelLine {
  readonly kit: number;
  readonly total: number;
  refunded: number;
  right: Right;
}
export interface ModelCredit {
  readonly at: Date;
  readonly net: number;
  readonly tax: number;
}

export class ModelOrder {
  readonly lines: ModelLine[];
  readonly total: number;
  readonly treatment: string;
  readonly isTaxWithin: boolean;
  country = '';
  isUnclear = false;
  paidAt: Date | null = null;
  refunded = 0;
  readonly credits: ModelCredit[] = [];

  constructor(
    readonly plan: PlannedOrder,
    readonly coupon: PlannedCoupon | null,
  ) {
    const wanted = wantedTreatment(plan);
    const isOff = wanted === 'reverse-charge' || wanted === 'business-abroad';
    const charged = (price: number): number => (isOff ? netOf(price, rates[plan.country] ?? 0) : price);
    const prices = plan.kits.map((kit) => charged(plannedKits[kit]?.priceMinor ?? 0));
    const discounts = coupon ? discountsOf(coupon, prices, charged) : prices.map(() => 0);
    this.lines = plan.kits.map((kit, at) => ({
      kit,
      total: (prices[at] ?? 0) - (discounts[at] ?? 0),
      refunded: 0,
      right: 'active',
    }));
    this.total = this.lines.reduce((sum, line) => sum + line.total, 0);
    this.treatment = this.total === 0 ? 'consumer' : wanted;
    this.isTaxWithin = this.treatment === 'consumer' || this.treatment === 'domestic-business';
  }

  get left(): number {
    return this.total - this.refunded;
  }

  pay(at: Date): void {
    this.paidAt = at;
    const { country, billing, card } = this.plan;
    const pieces = this.total === 0 ? [country] : [country, billing, card];
    const agreed = pieces.find((one, index) => pieces.indexOf(one) < index);
    this.country = this.treatment === 'consumer' ? (agreed ?? country) : country;
    this.isUnclear = this.total > 0 && (!agreed || agreed !== this.country);
  }

  /** In thousandths. */
  get rate(): number {
    return this.isTaxWithin && this.total > 0 ? (rates[this.country] ?? 0) : 0;
  }

  get net(): number {
    return netOf(this.total, this.rate);
  }

  /** What goes back takes the tax of all that has gone back, less that of what had before. */
  credit(amount: number, at: Date): void {
    const upTo = (gross: number): number => (gross === this.total ? this.net : netOf(gross, this.rate));
    const net = upTo(this.refunded + amount) - upTo(this.refunded);
    this.refunded += amount;
    this.credits.push({ at, net, tax: amount - net });
  }

  refundLine(at: number, amount: number, keeps: boolean, when: Date): void {
    const line = this.lines[at];
    if (!line) throw new Error('There is no such line.');
    line.refunded += amount;
    if (!keeps) line.right = 'ended';
    this.credit(amount, when);
  }

  refundAll(keeps: boolean, when: Date): void {
    this.credit(this.left, when);
    for (const line of this.lines) {
      line.refunded = line.total;
      if (!keeps) line.right = 'ended';
    }
  }

  turn(from: Right, to: Right): void {
    for (const line of this.lines) if (line.right === from) line.right = to;
  }

  lose(when: Date): void {
    this.credit(this.left, when);
    for (const line of this.lines) line.right = 'ended';
  }
}

const wantedTreatment = ({ business, country }: PlannedOrder): string => {
  if (!business) return 'consumer';
  if (country === SELLER) return 'domestic-business';
  if (!(country in rates)) return 'business-abroad';
  return business.vatNumber === '' ? 'consumer' : 'reverse-charge';
};

const discountsOf = (
  { off }: PlannedCoupon,
  prices: readonly number[],
  charged: (price: number) => number,
): number[] => {
  if (off.kind === 'fraction') return prices.map((price) => halfUp(price * off.numerator, off.denominator));
  const sum = prices.reduce((all, price) => all + price, 0);
  const amount = Math.min(charged(off.minor), sum);
  const exact = prices.map((price) => (sum === 0 ? 0 : (amount * price) / sum));
  const parts = exact.map(Math.floor);
  const order = prices
    .map((price, at) => ({ at, rest: sum === 0 ? 0 : (amount * price) % sum }))
    .sort((a, b) => b.rest - a.rest || a.at - b.at);
  let left = amount - parts.reduce((all, part) => all + part, 0);
  for (const { at } of order) {
    if (left === 0) break;
    parts[at] = (parts[at] ?? 0) + 1;
    left -= 1;
  }
  return parts;
};

/** One line of a quarter's summary, with amounts in minor units. */
export interface ModelRow {
  treatment: string;
  country: string;
  ratePercent: string;
  receipts: number;
  creditNotes: number;
  net: number;
  tax: number;
}

const quarterOf = (at: Date): number => Math.floor(at.getUTCMonth() / 3) + 1;

/** What a quarter of the plan's year should come to. */
export const modelQuarter = (orders: readonly ModelOrder[], quarter: number): ModelRow[] => {
  const rows = new Map<string, ModelRow>();
  const rowOf = (order: ModelOrder): ModelRow => {
    const ratePercent = String(order.rate / 10);
    const key = `${order.treatment} ${order.country} ${ratePercent}`;
    const known = rows.get(key) ?? {
      treatment: order.treatment,
      country: order.country,
      ratePercent,
      receipts: 0,
      creditNotes: 0,
      net: 0,
      tax: 0,
    };
    rows.set(key, known);
    return known;
  };
  for (const order of orders) {
    if (!order.paidAt || order.total === 0) continue;
    if (quarterOf(order.paidAt) === quarter) {
      const row = rowOf(order);
      row.receipts += 1;
      row.net += order.net;
      row.tax += order.total - order.net;
    }
    for (const credit of order.credits) {
      if (quarterOf(credit.at) !== quarter) continue;
      const row = rowOf(order);
      row.creditNotes += 1;
      row.net -= credit.net;
      row.tax -= credit.tax;
    }
  }
  return [...rows.values()];
};
