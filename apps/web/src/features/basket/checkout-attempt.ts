/** What an order is made of; another one needs another attempt. */
export interface WhatIsOrdered {
  licenceIds: readonly string[];
  couponCode: string | undefined;
  email: string;
  country: string;
  business?: { name: string; address: string; vatNumber: string } | undefined;
  gift?: { email: string; giver: string; greeting: string } | undefined;
}

type Keeping = Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;

const key = 'windchest.checkout-attempt';

const signatureOf = ({ licenceIds, couponCode, email, country, business, gift }: WhatIsOrdered): string =>
  JSON.stringify([
    [...licenceIds].sort(),
    couponCode ?? '',
    email.trim().toLowerCase(),
    country,
    business ? [business.name, business.address, business.vatNumber] : null,
    gift ? [gift.email, gift.giver, gift.greeting] : null,
  ]);

/** A version 4 UUID (RFC 9562, 5.4). `crypto.randomUUID` is missing where the shop is served without TLS. */
export function newAttempt(): string {
  const octets = crypto.getRandomValues(new Uint8Array(16));
  octets[6] = ((octets[6] ?? 0) & 0x0f) | 0x40;
  octets[8] = ((octets[8] ?? 0) & 0x3f) | 0x80;
  const hex = Array.from(octets, (octet) => octet.toString(16).padStart(2, '0')).join('');
  return hex.replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5');
}

/** For this page only, where the browser keeps nothing. */
let unkept: { signature: string; attempt: string } | undefined;

function kept(storage: () => Keeping): { signature: string; attempt: string } | undefined {
  try {
    return (JSON.parse(storage().getItem(key) ?? 'null') as typeof unkept | null) ?? unkept;
  } catch {
    return unkept;
  }
}

/**
 * The attempt this order is sent with: the same one as long as the same is ordered, so that what was sent
 * again after a broken connection opens the same checkout.
 */
export function attemptFor(ordered: WhatIsOrdered, storage: () => Keeping = () => sessionStorage): string {
  const signature = signatureOf(ordered);
  const last = kept(storage);
  if (last?.signature === signature && typeof last.attempt === 'string') return last.attempt;
  unkept = { signature, attempt: newAttempt() };
  try {
    storage().setItem(key, JSON.stringify(unkept));
  } catch {
    // A reload then begins a new attempt; the payment service still charges only what is paid.
  }
  return unkept.attempt;
}

/** The order of this attempt is over: the next one is a new order. */
export function dropAttempt(storage: () => Keeping = () => sessionStorage): void {
  unkept = undefined;
  try {
    storage().removeItem(key);
  } catch {
    // Nothing was kept.
  }
}
