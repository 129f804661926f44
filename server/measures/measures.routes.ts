import { Router } from 'express';
import { measureLimits, measureRoughness } from '#shared/contracts/measures';
import type { Deps } from '#server/deps';
import { bind } from '#server/http/bind';

export function measureRoutes({ measurements }: Pick<Deps, 'measurements'>): Router {
  const router = Router();
  bind(router, measureRoughness, ({ body }) => measurements.roughness(body));
  bind(router, measureLimits, ({ body }) => measurements.limits(body));
  return router;
}
