import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Asks the payment service for a refund and stays with it until it is settled. */
export const carryOutRefund = defineJob({
  name: 'orders.carry-out-refund',
  payload: z.object({ refundId: z.uuid() }),
  attempts: 100,
});
