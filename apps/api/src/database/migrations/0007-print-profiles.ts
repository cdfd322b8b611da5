import { inOrder } from './statements.js';

/** What estimates of plates, filament and time need of a mesh, kept beside its measurements. */
export const up = inOrder(
  `ALTER TABLE measurements ADD COLUMN print_profile JSON NULL, ADD COLUMN footprint JSON NULL`,
);
