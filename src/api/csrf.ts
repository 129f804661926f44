import { readCsrfToken } from '#shared/contracts/accounts';

let token: string | null = null;

/** The token that a changing request carries; asked for once and kept until it is forgotten. */
export async function csrfToken(): Promise<string> {
  if (token !== null) return token;
  const answer = await fetch(readCsrfToken.path, { credentials: 'same-origin', cache: 'no-store' });
  const parsed = readCsrfToken.response.safeParse(await answer.json().catch(() => null));
  // An empty token is refused by the server with a reason that the caller shows.
  if (!parsed.success) return '';
  token = parsed.data.csrfToken;
  return token;
}

/** To be called wherever the server begins a new session or refuses the token. */
export function forgetCsrfToken(): void {
  token = null;
}
