import { z } from 'zod';
import { defineJob } from '../jobs/job.js';

export const handlePaymentEvent = defineJob({
  name: 'orders.handle-payment-event',
  payload: z.object({ eventId: z.string().min(1).max(120) }),
  attempts: 20,
});
