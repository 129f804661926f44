import { randomUUID } from 'node:crypto';
import type { Response } from 'supertest';
import { insertAccount } from '#server/accounts/accounts.repository';
import type { Role } from '#shared/contracts/accounts';
import type { TestApp } from './app';

export const PASSWORD = 'seven swans a-swimming';

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** Somebody at a browser of their own. */
export interface Somebody {
  /** Sends what the page would, with the session's CSRF token. */
  send(method: Method, path: string, body?: object): Promise<Response>;
  /** Sends it as it is, with these headers and no token. */
  sendRaw(
    method: Method,
    path: string,
    headers: Record<string, string>,
    body?: object | string,
  ): Promise<Response>;
  signIn(email: string, password?: string): Promise<Response>;
}

export interface Person extends Somebody {
  readonly id: string;
  readonly email: string;
  readonly name: string;
}

export function somebody({ browser }: Pick<TestApp, 'browser'>): Somebody {
  const agent = browser();
  const request = (method: Method, path: string) =>
    ({
      GET: () => agent.get(path),
      POST: () => agent.post(path),
      PUT: () => agent.put(path),
      PATCH: () => agent.patch(path),
      DELETE: () => agent.delete(path),
    })[method]();
  const sendRaw: Somebody['sendRaw'] = async (method, path, headers, body) => {
    const prepared = request(method, path).set(headers);
    return body === undefined ? prepared : prepared.send(body);
  };
  const send: Somebody['send'] = async (method, path, body) => {
    if (method === 'GET') return sendRaw(method, path, {});
    const token = await agent.get('/api/session/csrf-token');
    return sendRaw(method, path, { 'x-csrf-token': String(token.body.csrfToken) }, body);
  };
  const signIn: Somebody['signIn'] = (email, password = PASSWORD) =>
    send('POST', '/api/session', { email, password });
  return { send, sendRaw, signIn };
}

interface NewPerson {
  readonly email?: string;
  readonly name?: string;
  readonly role?: Role;
  readonly confirmed?: boolean;
}

/** Puts an account into the database, as if its owner had signed up. */
export async function makeAccount(
  { deps }: TestApp,
  person: NewPerson = {},
): Promise<Omit<Person, keyof Somebody>> {
  const id = randomUUID();
  const { email = `${id}@people.example`, name = 'Somebody', role = 'composer', confirmed = true } = person;
  const now = deps.clock();
  const passwordHash = await deps.passwords.hash(PASSWORD);
  await insertAccount(deps.db, {
    id,
    email,
    name,
    role,
    passwordHash,
    confirmedAt: confirmed ? now : null,
    createdAt: now,
  });
  return { id, email, name };
}

/** Somebody with an account, signed in. */
export async function enter(test: TestApp, person: NewPerson = {}): Promise<Person> {
  const account = await makeAccount(test, person);
  const at = somebody(test);
  const answer = await at.signIn(account.email);
  if (answer.status !== 200) throw new Error(`could not sign in: ${answer.status}`);
  return { ...account, ...at };
}
