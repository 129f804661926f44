import session, { type CookieOptions, type SessionData } from 'express-session';
import type { Db } from '#server/db/connection';
import {
  endSession,
  IDLE_MS,
  keepSession,
  loadSession,
  touchSession,
} from '#server/sessions/sessions.repository';

declare module 'express-session' {
  interface SessionData {
    /** Absent for a visitor. */
    accountId?: string | undefined;
  }
}

type Done = (error?: unknown) => void;

function report(work: Promise<unknown>, done: Done = () => undefined): void {
  work.then(() => done(), done);
}

/** What express-session asks of a store, on the program's own database. */
export class SessionStore extends session.Store {
  constructor(
    private readonly db: Db,
    private readonly clock: () => Date,
    /** Not kept: the cookie follows the settings in force, not those of the day when it was made. */
    private readonly cookie: CookieOptions,
  ) {
    super();
  }

  override get(sid: string, done: (error: unknown, data?: SessionData | null) => void): void {
    loadSession(this.db, sid, this.clock()).then(
      (data) =>
        done(null, data === null ? null : { ...data, cookie: { ...this.cookie, originalMaxAge: IDLE_MS } }),
      (error: unknown) => done(error),
    );
  }

  override set(sid: string, data: SessionData, done?: Done): void {
    report(keepSession(this.db, sid, data, this.clock()), done);
  }

  override touch(sid: string, _data: SessionData, done?: Done): void {
    report(touchSession(this.db, sid, this.clock()), done);
  }

  override destroy(sid: string, done?: Done): void {
    report(endSession(this.db, sid, this.clock()), done);
  }
}
