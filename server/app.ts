import compression from 'compression';
import express, { Router, type Express } from 'express';
import { accountRoutes } from '#server/accounts/accounts.routes';
import { analysisRoutes } from '#server/analyses/analyses.routes';
import { annotationRoutes } from '#server/annotations/annotations.routes';
import { demoRoutes } from '#server/demo/demo.routes';
import type { Deps } from '#server/deps';
import { docsRoutes } from '#server/docs/docs.routes';
import { healthRoutes } from '#server/health/health.routes';
import { clientFiles } from '#server/http/client-files';
import { errorHandler, unknownRoute } from '#server/http/error-handler';
import { knownMethodsOnly, noStore, securityHeaders } from '#server/http/headers';
import { httpsOnly } from '#server/http/https-only';
import { requestLog } from '#server/http/request-log';
import { measureRoutes } from '#server/measures/measures.routes';
import { scriptCalls } from '#server/measures/script-calls';
import { csrfProtection } from '#server/sessions/csrf';
import { sessions, viewer } from '#server/sessions/session.middleware';
import { sessionRoutes } from '#server/sessions/sessions.routes';
import { clientFolder } from '#server/setup/product';
import { shelfRoutes } from '#server/shelf/shelf.routes';
import { shareRoutes } from '#server/shares/shares.routes';
import { studyRoutes } from '#server/studies/studies.routes';
import { versionRoutes } from '#server/studies/versions.routes';

/**
 * For scripts and lessons: knows nobody, reads and sets no cookie. It asks for no CSRF token, since such a token
 * guards what a signed-in person could be made to change, and nothing is changed or kept here.
 */
function scriptRouter(deps: Deps): Router {
  const router = Router();
  router.use(['/api/analysis', '/api/measures'], scriptCalls(deps));
  router.use(analysisRoutes(deps), measureRoutes(deps), docsRoutes(deps));
  return router;
}

/** What knows who is asking. */
function sessionRouter(deps: Deps): Router {
  const router = Router();
  router.use(sessions(deps), csrfProtection, viewer(deps));
  router.use(sessionRoutes(deps), accountRoutes(deps));
  router.use(studyRoutes(deps), shareRoutes(deps), annotationRoutes(deps));
  router.use(versionRoutes(deps), shelfRoutes(deps));
  if (deps.env.mode === 'demo') router.use(demoRoutes(deps));
  router.use('/api', unknownRoute);
  return router;
}

/** @param pages the folder of the built client; without it only the API is served. */
export function createApp(deps: Deps, pages = clientFolder): Express {
  const { env, log } = deps;
  const https = env.publicUrl.startsWith('https:');
  const api = sessionRouter(deps);
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', env.trustProxy);

  app.use(requestLog(log), securityHeaders(https), knownMethodsOnly);
  app.use('/api', noStore);
  app.use(healthRoutes(deps));
  if (https) app.use(httpsOnly(env.publicUrl));
  app.use(compression());
  app.use(scriptRouter(deps));
  app.use((req, res, next) => (/^\/api(\/|$)/i.test(req.path) ? api(req, res, next) : next()));
  if (pages !== undefined) app.use(clientFiles(pages));
  app.use(unknownRoute, errorHandler);
  return app;
}
