import type { Collection } from '../state/collection.js';
import { missing } from './errors.js';

/** The object with this id. @throws ApiError 404 that names kind and id, as the service does */
export function existing<T extends { id: string }>(
  collection: Collection<T>,
  kind: string,
  id: string,
  param = 'id',
): T {
  const found = collection.find(id);
  if (!found) throw missing(kind, id, param);
  return found;
}
