import { id } from '@windchest/contracts';
import { z } from 'zod';
import { defineJob } from '../jobs/job.js';

/** Mails those who wanted to hear of a kit's revisions, a portion at a time, going on after the last one. */
export const tellOfRevision = defineJob({
  name: 'letters.tell-of-revision',
  payload: z.object({ revisionId: id, after: z.string() }),
});
