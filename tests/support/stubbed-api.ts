import { vi } from 'vitest';

export interface StubbedRequest {
  readonly method: string;
  readonly path: string;
  readonly body: unknown;
  readonly csrfToken: string | null;
}

interface StubbedAnswer {
  readonly status?: number;
  readonly body: unknown;
}

type Handler = (request: StubbedRequest) => StubbedAnswer | Promise<StubbedAnswer>;

/** As every failure of the API is told. */
export function refusal(status: number, code: string, details?: unknown): StubbedAnswer {
  return { status, body: { error: { code, message: `told: ${code}`, details } } };
}

/** The connection is down. */
export const noAnswer: Handler = () => Promise.reject(new TypeError('Failed to fetch'));

/**
 * Puts a wire in place of the browser's: `GET /api/x` → what it answers. A list answers in turn, its last
 * for ever. Tokens are numbered, so that a refetched one can be told from the first.
 */
export function stubApi(routes: Readonly<Record<string, Handler | readonly Handler[]>>) {
  const requests: StubbedRequest[] = [];
  const turns = new Map<string, number>();
  let tokens = 0;

  async function answer(request: StubbedRequest): Promise<StubbedAnswer> {
    const name = `${request.method} ${request.path.split('?')[0]}`;
    if (name === 'GET /api/session/csrf-token') return { body: { csrfToken: `token-${++tokens}` } };
    const known = routes[name];
    const turn = turns.get(name) ?? 0;
    turns.set(name, turn + 1);
    const handler = typeof known === 'function' ? known : (known?.[turn] ?? known?.at(-1));
    return handler ? handler(request) : refusal(404, 'route.unknown');
  }

  vi.stubGlobal('fetch', async (path: string, init: RequestInit = {}) => {
    const headers = new Headers(init.headers);
    const request = {
      method: init.method ?? 'GET',
      path,
      body: typeof init.body === 'string' ? JSON.parse(init.body) : undefined,
      csrfToken: headers.get('x-csrf-token'),
    };
    requests.push(request);
    const { status = 200, body } = await answer(request);
    return new Response(JSON.stringify(body), { status, headers: { 'content-type': 'application/json' } });
  });
  const sent = (name: string) =>
    requests.filter(({ method, path }) => `${method} ${path.split('?')[0]}` === name);
  return { requests, sent };
}
