import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Compares a span of days with the payment service. */
export const reconcileBooks = defineJob({
  name: 'ledger.reconcile',
  payload: z.object({ reconciliationId: z.uuid() }),
  attempts: 5,
});
