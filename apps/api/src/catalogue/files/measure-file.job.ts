import { sha256 } from '@windchest/contracts';
import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Measures a stored mesh; the measuring room handles it. The name is for sentences about the file. */
export const measureFile = defineJob({
  name: 'catalogue.measure-file',
  payload: z.object({ sha256, fileName: z.string() }),
  attempts: 6,
});
