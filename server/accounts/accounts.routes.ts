import { Router } from 'express';
import {
  confirmAccount,
  requestConfirmation,
  requestPasswordReset,
  resetPassword,
  signUp,
} from '#shared/contracts/accounts';
import { confirm, mailConfirmation, registerAccount } from '#server/accounts/accounts.service';
import { changePasswordByLink, mailPasswordReset } from '#server/accounts/password-reset.service';
import type { Deps } from '#server/deps';
import { bind } from '#server/http/bind';
import { addressOf } from '#server/limits/limits.service';

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

  bind(router, confirmAccount, async ({ body }) => ({ email: await confirm(deps, body.token) }));

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
