import type { DemoPerson, DemoPurchase } from '../demo-types.js';
import { pay } from './pay.js';
import { waitFor, type ShopBrowser } from './shop-browser.js';

interface KitAnswer {
  licences: { id: string; kind: string }[];
}
interface ShelfAnswer {
  newest: { id: string };
}

/** Buys as a person would: basket, checkout, payment page, shelf, bundle. @returns the order's id */
export const buy = async (
  buyer: ShopBrowser,
  person: DemoPerson,
  purchase: DemoPurchase,
  stripeUrl: string,
): Promise<string> => {
  const items = await Promise.all(
    purchase.lines.map(async ({ kitSlug, licence }) => {
      const { licences } = await buyer.get<KitAnswer>(`/kits/${kitSlug}`);
      const found = licences.find((one) => one.kind === licence);
      if (!found) throw new Error(`${kitSlug} has no licence of the kind ${licence}.`);
      return { licenceId: found.id };
    }),
  );
  const { orderId, orderKey, paymentUrl } = await buyer.post<{
    orderId: string;
    orderKey: string;
    paymentUrl: string | null;
  }>('/checkout', {
    items,
    ...(purchase.couponCode ? { couponCode: purchase.couponCode } : {}),
    email: person.email,
    country: person.countryCode,
    ...(purchase.business ? { business: purchase.business } : {}),
    ...(purchase.gift ? { gift: purchase.gift } : {}),
    hasConsented: true,
    attempt: crypto.randomUUID(),
  });
  if (paymentUrl) await pay(stripeUrl, paymentUrl, person, purchase.paidFrom);
  await waitFor(
    'The payment',
    () => buyer.get<{ state: string }>(`/orders/${orderId}?key=${orderKey}`),
    (order) => order.state === 'paid',
  );

  if (purchase.gift) return orderId;
  for (const { kitSlug } of purchase.lines) {
    const { newest } = await buyer.get<ShelfAnswer>(`/shelf/${kitSlug}`);
    const grant = await buyer.post<{ url: string }>('/shelf/grants', { kitSlug, revisionId: newest.id });
    await buyer.download(grant.url);
  }
  return orderId;
};
