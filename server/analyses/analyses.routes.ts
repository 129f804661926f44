import { Router } from 'express';
import { createAnalysis } from '#shared/contracts/analysis';
import type { Deps } from '#server/deps';
import { bind } from '#server/http/bind';

export function analysisRoutes({ measurements }: Pick<Deps, 'measurements'>): Router {
  const router = Router();
  bind(router, createAnalysis, ({ body }) => measurements.analyse(body));
  return router;
}
