import { id } from '@windchest/contracts';
import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Writes to everybody who holds a revision that was withdrawn. */
export const tellHolders = defineJob({
  name: 'entitlements.tell-holders',
  payload: z.object({ revisionId: id }),
});
