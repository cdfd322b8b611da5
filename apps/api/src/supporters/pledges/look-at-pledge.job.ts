import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** One look at a moment that matters: a wish to pass on, the end of grace days, a pause that is over. */
export const lookAtPledge = defineJob({
  name: 'supporters.look',
  payload: z.object({ pledgeId: z.uuid() }),
  attempts: 100,
});

export const FIRST_LOOK_SECONDS = 60;

/** Looks after one pledge until it is over, whatever became of browser, events and processes. */
export const lookAfterPledge = defineJob({
  name: 'supporters.look-after',
  payload: z.object({ pledgeId: z.uuid() }),
  attempts: 100,
});
