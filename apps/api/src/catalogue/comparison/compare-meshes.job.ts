import { sha256 } from '@windchest/contracts';
import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Compares two stored meshes of a part, surface against surface; the measuring room handles it. */
export const compareMeshes = defineJob({
  name: 'catalogue.compare-meshes',
  payload: z.object({ beforeSha: sha256, afterSha: sha256 }),
  attempts: 6,
});
