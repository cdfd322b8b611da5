import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Supporters' shelves follow the kits of their plan. */
export const followPlan = defineJob({
  name: 'supporters.follow-plan',
  payload: z.object({ planId: z.uuid() }),
  attempts: 50,
});
