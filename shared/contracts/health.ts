import { z } from 'zod';
import { defineEndpoint } from '#shared/contracts/endpoint';

export const readHealth = defineEndpoint({
  method: 'GET',
  path: '/api/health',
  response: z.object({
    status: z.enum(['ok', 'degraded']),
    database: z.enum(['up', 'down']),
    version: z.string(),
  }),
});
