import { z } from 'zod';
import { defineJob } from '../jobs/job.js';

export const handlePaymentEvent = defineJob({
  name: 'payments.handle-event',
  payload: z.object({ eventId: z.string().min(1).max(120) }),
  attempts: 20,
});
