import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Estimates what printing a released revision takes: plates, filament, hours. */
export const estimatePrint = defineJob({
  name: 'catalogue.estimate-print',
  payload: z.object({ revisionId: z.uuid() }),
  attempts: 4,
});
