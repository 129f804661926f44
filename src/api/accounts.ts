import * as contract from '#shared/contracts/accounts';
import type { BodyInputOf } from '#shared/contracts/endpoint';
import { call } from '@/api/call';
import { forgetCsrfToken } from '@/api/csrf';

export const readSession = () => call(contract.readSession, {});

/** The server begins a new session here, so the token of the old one is forgotten. */
export async function signIn(body: BodyInputOf<typeof contract.signIn>) {
  const answer = await call(contract.signIn, { body });
  forgetCsrfToken();
  return answer;
}

export async function signOut() {
  const answer = await call(contract.signOut, {});
  forgetCsrfToken();
  return answer;
}

export const signUp = (body: BodyInputOf<typeof contract.signUp>) => call(contract.signUp, { body });

export const requestConfirmation = (email: string) => call(contract.requestConfirmation, { body: { email } });

/** Signs in too: see {@link signIn}. */
export async function confirmAccount(body: BodyInputOf<typeof contract.confirmAccount>) {
  const answer = await call(contract.confirmAccount, { body });
  forgetCsrfToken();
  return answer;
}

export const requestPasswordReset = (email: string) =>
  call(contract.requestPasswordReset, { body: { email } });

export const resetPassword = (body: BodyInputOf<typeof contract.resetPassword>) =>
  call(contract.resetPassword, { body });
