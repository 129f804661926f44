import { Router } from 'express';
import { readCsrfToken, readSession, signIn, signOut } from '#shared/contracts/accounts';
import type { Deps } from '#server/deps';
import { bind } from '#server/http/bind';
import { addressOf } from '#server/limits/limits.service';
import { csrfTokenFor } from '#server/sessions/csrf';
import { enterSession, leaveSession } from '#server/sessions/session.middleware';
import { authenticate } from '#server/sessions/sessions.service';

export function sessionRoutes(deps: Deps): Router {
  const router = Router();
  const demo = deps.env.mode === 'demo';

  bind(router, readSession, async ({ req }) => ({ account: req.viewer ?? null, demo }));

  bind(router, readCsrfToken, async ({ req }) => ({ csrfToken: csrfTokenFor(req) }));

  bind(router, signIn, async ({ req, body }) => {
    const account = await authenticate(deps, body, addressOf(req));
    await enterSession(req, account.id);
    req.log.info({ account: account.id }, 'signed in');
    return { account };
  });

  bind(router, signOut, async ({ req, res }) => {
    req.log.info({ account: req.viewer?.id }, 'signed out');
    await leaveSession(req, res, deps.env);
    return {};
  });

  return router;
}
