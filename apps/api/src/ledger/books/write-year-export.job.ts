import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Writes all records of a year into one zip. */
export const writeYearExport = defineJob({
  name: 'ledger.year-export',
  payload: z.object({ exportId: z.uuid() }),
  attempts: 3,
});
