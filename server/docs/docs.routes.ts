import { Router } from 'express';
import { readOpenApi } from '#shared/contracts/docs';
import type { Deps } from '#server/deps';
import { docsPage } from '#server/docs/docs.page';
import { makeExamples, type Examples } from '#server/docs/examples';
import { openApiDocument } from '#server/docs/openapi';
import { bind } from '#server/http/bind';
import { version } from '#server/setup/product';

/** The examples are computed when somebody first reads them, and stay as they are as long as the program runs. */
export function docsRoutes({ env, measurements }: Pick<Deps, 'env' | 'measurements'>): Router {
  let made: Promise<Examples> | undefined;
  const examples = () => {
    made ??= makeExamples(measurements).catch((error: unknown) => {
      // The next reader shall not be told of a fault that has passed.
      made = undefined;
      throw error;
    });
    return made;
  };
  const router = Router();
  bind(router, readOpenApi, async () => ({ ...openApiDocument(await examples(), version, env.publicUrl) }));
  router.get('/api/docs', async (_req, res) => {
    res.type('html').send(docsPage(await examples(), env.publicUrl));
  });
  return router;
}
