import { apiAddress } from '../../lib/api-address.js';

/** Where a picture of a post stands. */
export const pictureAddress = (pictureId: string): string =>
  apiAddress('GET /journal/pictures/:pictureId', { params: { pictureId } });
