import { z } from 'zod';

/** Somebody who calls the running program over HTTP and keeps cookies, as a browser would. */
export interface Caller {
  get(path: string): Promise<Response>;
  post(path: string, body: unknown): Promise<Response>;
}

const tokenSchema = z.object({ csrfToken: z.string() });

export function createCaller(url: string): Caller {
  const cookies = new Map<string, string>();
  const call = async (path: string, init: RequestInit = {}): Promise<Response> => {
    const cookie = [...cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    const answer = await fetch(url + path, { ...init, headers: { ...init.headers, cookie } });
    for (const line of answer.headers.getSetCookie()) {
      const [, name, value] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
      if (name && value !== undefined) cookies.set(name, value);
    }
    return answer;
  };
  return {
    get: call,
    post: async (path, body) => {
      const { csrfToken } = tokenSchema.parse(await (await call('/api/session/csrf-token')).json());
      const headers = { 'content-type': 'application/json', 'x-csrf-token': csrfToken };
      return call(path, { method: 'POST', body: JSON.stringify(body), headers });
    },
  };
}
