import { index, mysqlEnum, mysqlTable, uniqueIndex } from 'drizzle-orm/mysql-core';
import { SHARE_RIGHTS } from '#shared/contracts/shares';
import { EMAIL_LENGTH, exactText, ID_LENGTH, idText, time } from '#server/db/columns';
import { studies } from '#server/db/schema/studies';

/** A study opened to the holder of an address, whether or not they have an account yet. */
export const shares = mysqlTable(
  'shares',
  {
    id: idText({ length: ID_LENGTH }).primaryKey(),
    studyId: idText('study_id', { length: ID_LENGTH })
      .notNull()
      .references(() => studies.id, { onDelete: 'cascade' }),
    /** Normalised like an account's. */
    email: exactText({ length: EMAIL_LENGTH }).notNull(),
    may: mysqlEnum(SHARE_RIGHTS).notNull(),
    sharedAt: time('shared_at').notNull(),
  },
  (table) => [
    uniqueIndex('shares_once').on(table.studyId, table.email),
    index('shares_email').on(table.email, table.studyId),
  ],
);
