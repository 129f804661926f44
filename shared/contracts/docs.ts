import { z } from 'zod';
import { defineEndpoint } from '#shared/contracts/endpoint';

/** The routes for scripts and lessons as an OpenAPI document; people read it at /api/docs. */
export const readOpenApi = defineEndpoint({
  method: 'GET',
  path: '/api/openapi.json',
  response: z.looseObject({ openapi: z.string() }),
});
