import type { SignedIn } from '../http/person.js';

/**
 * May this visitor see this order? Its person may, and whoever holds its key. Nobody else, also no staff:
 * they have the workshop's own pages, with their own permission.
 * @param givenKeyHash hash of the key that came with the request, null without one
 */
export const maySeeOrder = (
  order: { readonly personId: string | null; readonly keyHash: string },
  person: Pick<SignedIn, 'id'> | null,
  givenKeyHash: string | null,
): boolean =>
  (person !== null && order.personId === person.id) ||
  (givenKeyHash !== null && order.keyHash === givenKeyHash);
