import { Router } from 'express';
import type { Pool } from 'mysql2/promise';
import { readHealth } from '#shared/contracts/health';
import { checkHealth } from '#server/health/health.service';
import { bind } from '#server/http/bind';
import { version } from '#server/setup/product';

const UNAVAILABLE = 503;

/** Mounted before sessions: it must answer when the database that keeps them is away. */
export function healthRoutes({ pool }: { readonly pool: Pool }): Router {
  const router = Router();
  bind(router, readHealth, async ({ res }) => {
    const health = await checkHealth(pool, version);
    if (health.database === 'down') res.status(UNAVAILABLE);
    return health;
  });
  return router;
}
