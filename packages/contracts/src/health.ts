import { z } from 'zod';
import { endpoint } from './endpoint.js';

export const healthEndpoints = {
  'GET /health/live': endpoint({
    access: 'public',
    summary: 'The process runs',
    response: z.object({ status: z.literal('live') }),
  }),
  'GET /health/ready': endpoint({
    access: 'public',
    summary: 'Database, storage and schema are ready',
    response: z.object({ status: z.literal('ready') }),
  }),
  'GET /metrics': endpoint({
    access: 'public',
    summary: 'Figures in the Prometheus text format, on loopback only',
    response: 'stream',
  }),
};
