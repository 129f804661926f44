import { index, mysqlTable } from 'drizzle-orm/mysql-core';
import { digest, ID_LENGTH, idText, longText, time } from '#server/db/columns';
import { accounts } from '#server/db/schema/accounts';

export const sessions = mysqlTable(
  'sessions',
  {
    /** SHA-256 of the session id: what lies in the database opens nothing. */
    id: digest().primaryKey(),
    /** Null for a visitor. */
    userId: idText('user_id', { length: ID_LENGTH }).references(() => accounts.id, { onDelete: 'cascade' }),
    data: longText().notNull(),
    createdAt: time('created_at').notNull(),
    /** Moves on with use, never beyond `endsAt`. */
    expiresAt: time('expires_at').notNull(),
    endsAt: time('ends_at').notNull(),
    /** A session that was ended stays until it expires, so that a slow request cannot save it back to life. */
    endedAt: time('ended_at'),
  },
  (table) => [index('sessions_user').on(table.userId), index('sessions_expiry').on(table.expiresAt)],
);
