import { id } from '@windchest/contracts';
import { z } from 'zod';
import { defineJob } from '../../jobs/job.js';

/** Builds and verifies a revision's bundle and releases it. */
export const buildRelease = defineJob({
  name: 'catalogue.build-release',
  payload: z.object({ revisionId: id }),
});
