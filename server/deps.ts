import type { Pool } from 'mysql2/promise';
import type { Logger } from 'pino';
import type { Passwords } from '#server/accounts/passwords';
import type { Db } from '#server/db/connection';
import type { Env } from '#server/env';
import type { MailSender } from '#server/mail/mail-sender';
import type { Measurements } from '#server/measures/measurements';
import type { Summaries } from '#server/studies/summaries';

/** Everything that the program stands on, made once at the start and passed in. */
export interface Deps {
  readonly env: Env;
  readonly db: Db;
  readonly pool: Pool;
  readonly log: Logger;
  readonly clock: () => Date;
  readonly passwords: Passwords;
  readonly mailer: MailSender;
  readonly measurements: Measurements;
  readonly summaries: Summaries;
}
