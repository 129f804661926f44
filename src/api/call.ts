import { errorBodySchema } from '#shared/contracts/errors';
import type { BodyInputOf, Endpoint, ParamsOf, QueryInputOf, ResponseOf } from '#shared/contracts/endpoint';
import { ApiError, NO_ANSWER, UNREADABLE } from '@/api/api-error';
import { csrfToken, forgetCsrfToken } from '@/api/csrf';
import { pathOf, queryOf } from '@/api/address';

/** Only what the endpoint declares, and all of it. */
export type CallInput<E extends Endpoint> = (E extends { params: unknown }
  ? { params: ParamsOf<E> }
  : object) &
  (E extends { query: unknown } ? { query: QueryInputOf<E> } : object) &
  (E extends { body: unknown } ? { body: BodyInputOf<E> } : object);

interface LooseInput {
  readonly params?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string | number | undefined>>;
  readonly body?: unknown;
}

const UNAUTHORISED = 401;
const FORBIDDEN = 403;
const CSRF_REFUSED = 'csrf.invalid';

let sessionEnded: () => void = () => undefined;

/** Names whom to tell when the server no longer knows who is asking. */
export function onSessionEnded(listener: () => void): void {
  sessionEnded = listener;
}

/**
 * Calls one endpoint and reads its answer by the contract.
 * @throws ApiError for every refusal and every failure to get through
 */
export async function call<E extends Endpoint>(endpoint: E, input: CallInput<E>): Promise<ResponseOf<E>> {
  try {
    return await attempt(endpoint, input);
  } catch (error) {
    if (!isCsrfRefusal(error)) throw error;
    // The token goes with the session: a sign-in or sign-out in another tab makes ours old.
    forgetCsrfToken();
    return attempt(endpoint, input);
  }
}

function isCsrfRefusal(error: unknown): boolean {
  return error instanceof ApiError && error.status === FORBIDDEN && error.code === CSRF_REFUSED;
}

async function attempt<E extends Endpoint>(endpoint: E, input: LooseInput): Promise<ResponseOf<E>> {
  const answer = await send(endpoint, input);
  const data: unknown = await answer.json().catch(() => null);
  if (!answer.ok) throw refusal(answer.status, data);
  const parsed = endpoint.response?.safeParse(data);
  if (parsed && !parsed.success) throw unreadable(answer.status);
  // Holds because the endpoint's own response schema has just parsed this very value.
  return parsed?.data as ResponseOf<E>;
}

async function send(endpoint: Endpoint, input: LooseInput): Promise<Response> {
  const headers: Record<string, string> = { accept: 'application/json' };
  if (input.body !== undefined) headers['content-type'] = 'application/json';
  try {
    if (endpoint.method !== 'GET') headers['x-csrf-token'] = await csrfToken();
    return await fetch(pathOf(endpoint.path, input.params) + queryOf(input.query), {
      method: endpoint.method,
      headers,
      body: input.body === undefined ? null : JSON.stringify(input.body),
      credentials: 'same-origin',
      cache: 'no-store',
    });
  } catch {
    throw new ApiError(0, NO_ANSWER, 'The server does not answer: the connection may be down.');
  }
}

function refusal(status: number, data: unknown): ApiError {
  const parsed = errorBodySchema.safeParse(data);
  if (!parsed.success) return unreadable(status);
  const { code, message, details } = parsed.data.error;
  if (status === UNAUTHORISED) sessionEnded();
  return new ApiError(status, code, message, details);
}

function unreadable(status: number): ApiError {
  return new ApiError(
    status,
    UNREADABLE,
    `The server answered something that cannot be read (status ${status}).`,
  );
}
