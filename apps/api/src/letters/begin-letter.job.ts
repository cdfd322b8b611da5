import { id } from '@windchest/contracts';
import { z } from 'zod';
import { defineJob } from '../jobs/job.js';

/** Freezes a letter's readers when its time has come, and sets its lanes going. */
export const beginLetter = defineJob({
  name: 'letters.begin',
  payload: z.object({ letterId: id, run: z.int() }),
});

/** Sends a letter to its readers, a few seconds at a time; several lanes go at once, on any process. */
export const sendLetter = defineJob({
  name: 'letters.send',
  payload: z.object({ letterId: id, run: z.int(), lane: z.int() }),
  attempts: 1000,
  retryAfterSeconds: (failures) => Math.min(2 ** failures, 30),
});

/** Leaves workers of a process free for everything else. */
export const LANES = 2;
