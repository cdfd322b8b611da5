import type { UncertaintyTerm } from './uncertainty.js';

/** What one kind of voice says about itself: its fundamental, what makes that unsure, what to beware of. */
export type Sounding = { hz: number; terms: UncertaintyTerm[]; warnings: string[] };
