import { z } from 'zod';
import { defineJob } from '../jobs/job.js';

export const FIRST_LOOK_SECONDS = 60;

/**
 * Looks after one order until it is final, and after its money as long as a bank may still take that back, whatever
 * becomes of browser, events and processes.
 */
export const reconcileOrder = defineJob({
  name: 'orders.reconcile',
  payload: z.object({ orderId: z.uuid() }),
  attempts: 100,
});
