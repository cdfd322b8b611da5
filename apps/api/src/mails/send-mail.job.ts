import { z } from 'zod';
import { defineJob } from '../jobs/job.js';

export const sendMail = defineJob({
  name: 'mails.send',
  payload: z.object({ mailId: z.uuid() }),
  attempts: 20,
});
