import { inOrder } from './statements.js';

/** An order for somebody else: who gets it, from whom, and the line that goes with it. */
export const up = inOrder(`ALTER TABLE orders ADD COLUMN gift JSON NULL AFTER business`);
