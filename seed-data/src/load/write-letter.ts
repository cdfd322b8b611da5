import type { DemoLetter } from '../demo-types.js';
import { waitFor, type ShopBrowser } from './shop-browser.js';

/** The maker writes a letter and, where the demo says so, sends it and waits until it is out. */
export const writeLetter = async (
  maker: ShopBrowser,
  { kitSlug, isSent, ...words }: DemoLetter,
  kitIds: ReadonlyMap<string, string>,
): Promise<void> => {
  const kitId = kitSlug === null ? null : (kitIds.get(kitSlug) ?? null);
  const { id } = await maker.post<{ id: string }>('/workshop/letters', {
    ...words,
    kitId,
    revisionId: null,
    leavesOutUnneeded: true,
    perMinute: 300,
    audience: {
      ownsKit: kitId !== null,
      heldFromId: null,
      heldToId: null,
      withNothingHeld: true,
      sources: [],
      nozzlesMm: [],
      materials: [],
      reportedParts: [],
      countries: [],
      askedForNews: false,
    },
  });
  if (!isSent) return;
  await maker.post(`/workshop/letters/${id}/sending`, { sendAt: null });
  await waitFor(
    'The letter',
    () => maker.get<{ state: string }>(`/workshop/letters/${id}`),
    ({ state }) => state === 'sent',
  );
};
