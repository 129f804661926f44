import { index, int, mysqlTable } from 'drizzle-orm/mysql-core';
import { digest, time } from '#server/db/columns';

/** What was tried how often: one counter for each rule and subject. */
export const limits = mysqlTable(
  'limits',
  {
    /** SHA-256 of the rule's name and its subject (an address, an account): nothing readable is kept. */
    id: digest().primaryKey(),
    count: int().notNull(),
    /** Until then the subject has to wait; null: it need not. */
    blockedUntil: time('blocked_until'),
    /** Then the counter starts anew. */
    resetsAt: time('resets_at').notNull(),
  },
  (table) => [index('limits_reset').on(table.resetsAt)],
);
