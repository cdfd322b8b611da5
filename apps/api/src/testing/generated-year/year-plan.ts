import { Chance } from './chance.js';

export interface PlannedKit {
  readonly name: string;
  readonly priceMinor: number;
}
export const plannedKits: readonly [PlannedKit, ...PlannedKit[]] = [
  { name: 'Curlew', priceMinor: 2400 },
  { name: 'Knot', priceMinor: 1999 },
  { name: 'Teal', priceMinor: 900 },
  { name: 'Godwit', priceMinor: 6001 },
  { name: 'Gauge', priceMinor: 0 },
];

export interface PlannedCoupon {
  readonly code: string;
  readonly off:
    { kind: 'fraction'; numerator: number; denominator: number } | { kind: 'amount'; minor: number };
  readonly cap: number | null;
  readonly perBuyer: number | null;
  readonly minBasketMinor: number | null;
}

/** What becomes of money after a payment, so many hours later. */
export type Aftermath =
  | { readonly kind: 'refund'; readonly hours: number; readonly keeps: boolean; readonly whole: true }
  | {
      readonly kind: 'refund';
      readonly hours: number;
      readonly keeps: boolean;
      readonly whole: false;
      /** Of one line. */
      readonly line: number;
      readonly thousandths: number;
    }
  | { readonly kind: 'refund-outside'; readonly hours: number; readonly thousandths: number }
  | {
      readonly kind: 'dispute';
      readonly hours: number;
      readonly endHours: number;
      readonly end: 'won' | 'lost';
    };

export interface PlannedOrder {
  readonly at: Date;
  readonly email: string;
  /** Signed in as the account of this address. */
  readonly isSignedIn: boolean;
  readonly kits: readonly number[];
  readonly couponCode: string | null;
  readonly country: string;
  readonly billing: string;
  readonly card: string;
  readonly business: { readonly vatNumber: string } | null;
  readonly giftTo: string | null;
  readonly end: 'paid' | 'cancelled' | 'expired';
  readonly after: readonly Aftermath[];
}

export interface YearPlan {
  readonly year: number;
  readonly coupons: readonly PlannedCoupon[];
  /** Addresses with an account, proved. */
  readonly accounts: readonly string[];
  /** In the order of time. */
  readonly orders: readonly PlannedOrder[];
}

const countries = [
  ['DE', 30],
  ['FR', 18],
  ['IT', 9],
  ['FI', 7],
  ['AT', 8],
  ['IE', 8],
  ['US', 12],
  ['CH', 5],
  ['JP', 3],
] as const;
const vatNumbers: Readonly<Record<string, string>> = {
  DE: 'DE123456789',
  FR: 'FR12123456789',
  IT: 'IT12345678901',
  FI: 'FI12345678',
  AT: 'ATU12345678',
  IE: 'IE1234567T',
};
const HOUR_MS = 3_600_000;

/** A year of orders with all that happens to them, made by chance from a seed. */
export const planYear = (seed: number, count: number, year: number): YearPlan => {
  const chance = new Chance(seed);
  const accounts = Array.from({ length: Math.ceil(count / 40) }, (_, n) => `regular-${n}@mail.example`);
  const coupons: PlannedCoupon[] = [
    {
      code: 'THIRD',
      off: { kind: 'fraction', numerator: 1, denominator: 3 },
      cap: Math.ceil(count / 20),
      perBuyer: 1,
      minBasketMinor: null,
    },
    {
      code: 'FIVE',
      off: { kind: 'amount', minor: 500 },
      cap: null,
      perBuyer: 3,
      minBasketMinor: 2000,
    },
    {
      code: 'WHOLE',
      off: { kind: 'fraction', numerator: 1, denominator: 1 },
      cap: Math.ceil(count / 100),
      perBuyer: null,
      minBasketMinor: null,
    },
  ];
  const start = Date.UTC(year, 0, 1, 6);
  // What happens to the last of them must still happen in the year.
  const hours = 340 * 24;
  const times = Array.from({ length: count }, () => chance.next()).sort((a, b) => a - b);
  const orders = times.map((part, n) =>
    planOrder(chance, new Date(start + Math.floor(part * hours) * HOUR_MS), n, accounts),
  );
  return { year, coupons, accounts, orders };
};

const planOrder = (chance: Chance, at: Date, n: number, accounts: readonly string[]): PlannedOrder => {
  const isRegular = chance.isHit(0.3) && accounts.length > 0;
  const email = isRegular
    ? (accounts[chance.between(0, accounts.length - 1)] ?? '')
    : `guest-${n}@mail.example`;
  const country = chance.weighted(countries);
  const elsewhere = (): string => chance.weighted(countries);
  const isStraight = chance.isHit(0.9);
  const isBusiness = chance.isHit(0.12);
  const isGift = !isBusiness && chance.isHit(0.05);
  const end = chance.weighted([
    ['paid', 88],
    ['cancelled', 6],
    ['expired', 6],
  ] as const);
  const kits = [
    ...new Set(Array.from({ length: chance.between(1, 3) }, () => chance.between(0, plannedKits.length - 1))),
  ];
  return {
    at,
    email,
    isSignedIn: isRegular && chance.isHit(0.5),
    // A gift must cost something, whatever coupon comes with it.
    kits: isGift ? [chance.between(0, 3)] : kits,
    couponCode: isGift
      ? null
      : chance.weighted([
          [null, 70],
          ['THIRD', 15],
          ['FIVE', 12],
          ['WHOLE', 3],
        ] as const),
    country,
    billing: isStraight ? country : elsewhere(),
    card: isStraight || chance.isHit(0.5) ? country : elsewhere(),
    business: isBusiness ? { vatNumber: chance.isHit(0.8) ? (vatNumbers[country] ?? '') : '' } : null,
    giftTo: isGift ? `friend-${n % 50}@mail.example` : null,
    end,
    after: end === 'paid' ? planAfter(chance) : [],
  };
};

const planAfter = (chance: Chance): Aftermath[] => {
  const hours = chance.between(24, 240);
  const keeps = chance.isHit(0.3);
  const dice = chance.next();
  if (dice < 0.03) return [{ kind: 'refund', hours, keeps, whole: true }];
  const part = { hours, keeps, whole: false as const, line: chance.between(0, 2) };
  if (dice < 0.06) return [{ kind: 'refund', ...part, thousandths: chance.between(1, 1000) }];
  if (dice < 0.07)
    return [
      { kind: 'refund', ...part, thousandths: chance.between(1, 900) },
      { kind: 'refund', hours: hours + 48, keeps: !keeps, whole: true },
    ];
  if (dice < 0.08) return [{ kind: 'refund-outside', hours, thousandths: chance.between(1, 1000) }];
  if (dice < 0.1)
    return [
      {
        kind: 'dispute',
        hours,
        endHours: hours + chance.between(48, 200),
        end: chance.isHit(0.5) ? 'won' : 'lost',
      },
    ];
  if (dice < 0.105)
    return [
      { kind: 'refund', ...part, thousandths: chance.between(1, 500) },
      { kind: 'dispute', hours: hours + 30, endHours: hours + 130, end: chance.isHit(0.5) ? 'won' : 'lost' },
    ];
  return [];
};
