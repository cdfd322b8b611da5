import { sha256 } from '@windchest/contracts';
import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Measures a stored mesh; the measuring room handles it. The name is for sentences about the file. */
export const measureFile = defineJob({
  name: 'catalogue.measure-file',
  payload: z.object({ sha256, fileName: z.string() }),
  attempts: 6,
});

/** Measures a mesh anew that an older measurer measured; what was found before stands until then. */
export const renewMeasurement = defineJob({
  name: 'catalogue.renew-measurement',
  payload: z.object({ sha256, fileName: z.string() }),
  attempts: 6,
});

/** Has everything measured anew that an older measurer measured: once for each version of the measurer. */
export const renewMeasurements = defineJob({
  name: 'catalogue.renew-measurements',
  payload: z.object({ version: z.int() }),
});
