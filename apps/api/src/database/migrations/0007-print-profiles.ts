import { inOrder } from './statements.js';

/** What estimates of plates, filament and time need of a mesh, kept beside its measurements. */
export const up = inOrder(
  `ALTER TABLE measurements ADD COLUMN print_profile JSON NULL, ADD COLUMN footprint JSON NULL`,
  // The date of the build book: it must not move when a bundle is built again.
  `ALTER TABLE revisions ADD COLUMN release_asked_at DATETIME(6) NULL`,
);
