import session, { type CookieOptions } from 'express-session';
import type { Request, RequestHandler, Response } from 'express';
import { findAccount } from '#server/accounts/accounts.repository';
import type { Db } from '#server/db/connection';
import { IDLE_MS } from '#server/sessions/sessions.repository';
import { csrfTokenFor } from '#server/sessions/csrf';
import { SessionStore } from '#server/sessions/session.store';

interface Where {
  readonly publicUrl: string;
  readonly port: number;
}

function isHttps({ publicUrl }: Where): boolean {
  return publicUrl.startsWith('https:');
}

/** `__Host-` binds the cookie to this host, but needs https; on http the port keeps copies apart. */
export function cookieName(where: Where): string {
  return isHttps(where) ? '__Host-siltline.sid' : `siltline.sid.${where.port}`;
}

function cookieOptions(where: Where) {
  return {
    path: '/',
    httpOnly: true,
    sameSite: 'lax',
    secure: isHttps(where),
    maxAge: IDLE_MS,
  } satisfies CookieOptions;
}

interface SessionDeps {
  readonly db: Db;
  readonly clock: () => Date;
  readonly env: Where & { readonly sessionSecret: string };
}

export function sessions({ db, clock, env }: SessionDeps): RequestHandler {
  const cookie = cookieOptions(env);
  return session({
    name: cookieName(env),
    secret: env.sessionSecret,
    cookie,
    rolling: true,
    resave: false,
    saveUninitialized: false,
    store: new SessionStore(db, clock, cookie),
  });
}

/** Finds who is signed in, as they are now: a role that was changed holds from the next request on. */
export function viewer({ db }: Pick<SessionDeps, 'db'>): RequestHandler {
  return async (req, _res, next) => {
    const { accountId } = req.session;
    req.viewer = accountId === undefined ? null : await findAccount(db, accountId);
    next();
  };
}

function settled(work: (done: (error?: unknown) => void) => void): Promise<void> {
  return new Promise((resolve, reject) => {
    work((error) => (error ? reject(error) : resolve()));
  });
}

/** Gives the session a new id before it is trusted: one that was planted beforehand opens nothing. */
export async function enterSession(req: Request, accountId: string): Promise<void> {
  await settled((done) => req.session.regenerate(done));
  req.session.accountId = accountId;
  // Made now, so that requests that ask for it at the same time are given the same one.
  csrfTokenFor(req);
  await settled((done) => req.session.save(done));
}

export async function leaveSession(req: Request, res: Response, where: Where): Promise<void> {
  await settled((done) => req.session.destroy(done));
  const { path, httpOnly, sameSite, secure } = cookieOptions(where);
  res.clearCookie(cookieName(where), { path, httpOnly, sameSite, secure });
}
