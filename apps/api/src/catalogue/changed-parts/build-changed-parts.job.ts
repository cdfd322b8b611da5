import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Builds and verifies a bundle of changed parts. */
export const buildChangedParts = defineJob({
  name: 'catalogue.build-changed-parts',
  payload: z.object({ needHash: z.string().length(64) }),
  attempts: 4,
});
