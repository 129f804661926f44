import { join } from 'node:path';
import express, { Router } from 'express';

const YEAR_S = 365 * 24 * 60 * 60;
/** Pages have no dot in their address: `/.git/config` or a missing picture is no page. */
const PAGE = /^[A-Za-z0-9/_-]*$/;

/** The built client: files named by their content are kept for good, every page is `index.html`. */
export function clientFiles(folder: string): Router {
  const router = Router();
  const index = join(folder, 'index.html');
  const assets = { immutable: true, maxAge: YEAR_S * 1000, index: false, redirect: false } as const;
  router.use('/assets', express.static(join(folder, 'assets'), assets));
  router.use(express.static(folder, { index: false, redirect: false, maxAge: 0 }));
  router.get('/{*path}', (req, res, next) => {
    if (!PAGE.test(req.path) || req.path.startsWith('/assets/')) return next();
    res.set('Cache-Control', 'no-cache').sendFile(index);
  });
  return router;
}
