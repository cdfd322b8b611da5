import type { DemoPrints } from '../demo-types.js';
import type { ShopBrowser } from './shop-browser.js';

interface PrintedAnswer {
  revision: { id: string };
  parts: { code: string; quantity: number }[];
}

/** Somebody writes down how far their build of the revision they hold is. */
export const sayPrinted = async (
  buyer: ShopBrowser,
  { kitSlug, notYet, begun }: DemoPrints,
): Promise<void> => {
  const { revision, parts } = await buyer.get<PrintedAnswer>(`/shelf/${kitSlug}/printed`);
  for (const { code, quantity } of parts)
    await buyer.put(`/shelf/${kitSlug}/printed`, {
      revisionId: revision.id,
      code,
      quantity: notYet.includes(code) ? 0 : (begun[code] ?? quantity),
    });
};
