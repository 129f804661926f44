import { index, mysqlEnum, mysqlTable } from 'drizzle-orm/mysql-core';
import { digest, ID_LENGTH, idText, time } from '#server/db/columns';
import { accounts } from '#server/db/schema/accounts';

export const TOKEN_PURPOSES = ['confirmation', 'password-reset'] as const;
export type TokenPurpose = (typeof TOKEN_PURPOSES)[number];

/** The secrets of mailed links, as digests. */
export const tokens = mysqlTable(
  'tokens',
  {
    digest: digest().primaryKey(),
    accountId: idText('account_id', { length: ID_LENGTH })
      .notNull()
      .references(() => accounts.id, { onDelete: 'cascade' }),
    purpose: mysqlEnum(TOKEN_PURPOSES).notNull(),
    createdAt: time('created_at').notNull(),
    expiresAt: time('expires_at').notNull(),
    usedAt: time('used_at'),
  },
  (table) => [index('tokens_account').on(table.accountId, table.purpose)],
);
