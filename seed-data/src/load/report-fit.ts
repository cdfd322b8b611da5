import type { DemoFitReport } from '../demo-types.js';
import type { ShopBrowser } from './shop-browser.js';

interface ShelfAnswer {
  held: { id: string } | null;
  newest: { id: string };
  reprint: { parts: { code: string }[] };
}

/** A buyer says how a part fits; where the demo has an answer, the maker gives it. */
export const reportFit = async (
  buyer: ShopBrowser,
  maker: ShopBrowser,
  { buyerEmail: _, kitSlug, partIndex, answer, ...words }: DemoFitReport,
): Promise<void> => {
  const shelf = await buyer.get<ShelfAnswer>(`/shelf/${kitSlug}`);
  const codes = shelf.reprint.parts.map(({ code }) => code).toSorted();
  const { id } = await buyer.post<{ id: string }>(`/shelf/${kitSlug}/fit-reports`, {
    ...words,
    clearance: null,
    revisionId: (shelf.held ?? shelf.newest).id,
    partCode: codes[partIndex] ?? codes[0] ?? '',
  });
  if (answer !== null) await maker.post(`/workshop/fit-reports/${id}/answers`, { text: answer });
};
