import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { signOut as signOutContract } from '#shared/contracts/accounts';
import { readHealth } from '#shared/contracts/health';
import * as accounts from '@/api/accounts';
import { ApiError, NO_ANSWER, UNREADABLE } from '@/api/api-error';
import { call, onSessionEnded } from '@/api/call';
import { forgetCsrfToken } from '@/api/csrf';
import { listStudies } from '@/api/studies';
import { noAnswer, refusal, stubApi } from '../../../support/stubbed-api';

const ACCOUNT = { id: 'account-1', name: 'Ada Fenn', email: 'ada@river.example', role: 'composer' };
const signedIn = () => ({ body: { account: ACCOUNT } });
const done = () => ({ body: {} });

beforeEach(forgetCsrfToken);
afterEach(() => {
  onSessionEnded(() => undefined);
  vi.unstubAllGlobals();
});

async function failureOf(work: Promise<unknown>): Promise<ApiError> {
  const error: unknown = await work.catch((caught: unknown) => caught);
  if (!(error instanceof ApiError)) throw new Error('it was expected to fail with an ApiError');
  return error;
}

describe('the caller', () => {
  it('when it reads, then it asks for no token', async () => {
    const api = stubApi({
      'GET /api/health': () => ({ body: { status: 'ok', database: 'up', version: '1' } }),
    });
    expect(await call(readHealth, {})).toEqual({ status: 'ok', database: 'up', version: '1' });
    expect(api.requests).toHaveLength(1);
  });

  it('when it writes twice, then both carry the token that was fetched once', async () => {
    const api = stubApi({ 'POST /api/accounts': done });
    const form = {
      email: 'ada@river.example',
      name: 'Ada Fenn',
      password: 'reeds and water',
      role: 'student',
    } as const;
    await accounts.signUp(form);
    await accounts.signUp(form);
    expect(api.sent('POST /api/accounts').map(({ csrfToken }) => csrfToken)).toEqual(['token-1', 'token-1']);
    expect(api.sent('POST /api/accounts')[0]?.body).toEqual(form);
  });

  it('when the token is refused, then a new one is fetched and the request sent once more', async () => {
    const api = stubApi({ 'DELETE /api/session': [() => refusal(403, 'csrf.invalid'), done] });
    await call(signOutContract, {});
    expect(api.sent('DELETE /api/session').map(({ csrfToken }) => csrfToken)).toEqual(['token-1', 'token-2']);
  });

  it('when the new token is refused too, then that is told and nothing is sent a third time', async () => {
    const api = stubApi({ 'DELETE /api/session': () => refusal(403, 'csrf.invalid') });
    expect((await failureOf(call(signOutContract, {}))).code).toBe('csrf.invalid');
    expect(api.sent('DELETE /api/session')).toHaveLength(2);
  });

  it('when another thing is forbidden, then it is not sent again', async () => {
    const api = stubApi({ 'DELETE /api/session': () => refusal(403, 'action.forbidden') });
    expect((await failureOf(call(signOutContract, {}))).code).toBe('action.forbidden');
    expect(api.sent('DELETE /api/session')).toHaveLength(1);
  });

  it('when somebody signs in or out, then the next write has a token of the new session', async () => {
    const api = stubApi({
      'POST /api/session': signedIn,
      'DELETE /api/session': done,
      'POST /api/accounts': done,
    });
    await accounts.signIn({ email: 'ada@river.example', password: 'reeds and water' });
    await accounts.signOut();
    await accounts.signUp({
      email: 'b@river.example',
      name: 'B',
      password: 'reeds and water',
      role: 'student',
    });
    const writes = api.requests.filter(({ method }) => method !== 'GET');
    expect(writes.map(({ csrfToken }) => csrfToken)).toEqual(['token-1', 'token-2', 'token-3']);
  });

  it('when there is no answer, then that is told as something that may pass', async () => {
    stubApi({ 'GET /api/health': noAnswer });
    const failure = await failureOf(call(readHealth, {}));
    expect([failure.code, failure.status, failure.isPassing]).toEqual([NO_ANSWER, 0, true]);
  });

  it('when an answer is not what the contract says, then it is refused', async () => {
    stubApi({ 'GET /api/health': () => ({ body: { status: 'splendid' } }) });
    expect((await failureOf(call(readHealth, {}))).code).toBe(UNREADABLE);
  });

  it('when faults are told, then each comes with its path', async () => {
    const faults = [{ path: 'query.limit', message: 'too many' }];
    stubApi({ 'GET /api/studies': () => refusal(422, 'input.invalid', faults) });
    const failure = await failureOf(listStudies({ limit: 50 }));
    expect([failure.status, failure.faults, failure.isPassing]).toEqual([422, faults, false]);
  });

  it('when the session is no longer known, then whoever listens is told', async () => {
    stubApi({ 'GET /api/studies': () => refusal(401, 'session.required') });
    const heard = vi.fn();
    onSessionEnded(heard);
    await failureOf(listStudies({}));
    expect(heard).toHaveBeenCalledOnce();
  });
});
