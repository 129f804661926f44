import { Router } from 'express';
import {
  confirmAccount,
  requestConfirmation,
  requestPasswordReset,
  resetPassword,
  signUp,
} from '#shared/contracts/accounts';
import { mailConfirmation, registerAccount } from '#server/accounts/accounts.service';
import { confirm } from '#server/accounts/confirmation.service';
import { changePasswordByLink, mailPasswordReset } from '#server/accounts/password-reset.service';
import type { Deps } from '#server/deps';
import { bind } from '#server/http/bind';
import { addressOf } from '#server/limits/limits.service';
import { enterSession } from '#server/sessions/session.middleware';

/** All of it is open to visitors, and answers alike whether or not an address is known. */
export function accountRoutes(deps: Deps): Router {
  const router = Router();

  bind(router, signUp, async ({ req, body }) => {
    await registerAccount(deps, body, addressOf(req));
    return {};
  });

  bind(router, requestConfirmation, async ({ req, body }) => {
    await mailConfirmation(deps, body, addressOf(req));
    return {};
  });

  bind(router, confirmAccount, async ({ req, body }) => {
    const account = await confirm(deps, body, addressOf(req));
    await enterSession(req, account.id);
    req.log.info({ account: account.id }, 'confirmed and signed in');
    return { account };
  });

  bind(router, requestPasswordReset, async ({ req, body }) => {
    await mailPasswordReset(deps, body, addressOf(req));
    return {};
  });

  bind(router, resetPassword, async ({ body }) => {
    await changePasswordByLink(deps, body);
    return {};
  });

  return router;
}
