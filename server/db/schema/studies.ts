import { index, int, mysqlTable, uniqueIndex } from 'drizzle-orm/mysql-core';
import { ID_LENGTH, idText, time } from '#server/db/columns';
import { accounts } from '#server/db/schema/accounts';

export const studies = mysqlTable(
  'studies',
  {
    id: idText({ length: ID_LENGTH }).primaryKey(),
    ownerId: idText('owner_id', { length: ID_LENGTH })
      .notNull()
      .references(() => accounts.id, { onDelete: 'cascade' }),
    /** The number of the newest accepted save: given out under a lock of this row, so without a gap. */
    newestNumber: int('newest_number').notNull(),
    /** How many saves were set aside; they are numbered on their own. */
    setAsideCount: int('set_aside_count').notNull().default(0),
    savedAt: time('saved_at').notNull(),
    createdAt: time('created_at').notNull(),
    deletedAt: time('deleted_at'),
    requestKey: idText('request_key', { length: ID_LENGTH }).notNull(),
  },
  (table) => [
    uniqueIndex('studies_request').on(table.ownerId, table.requestKey),
    index('studies_owner_newest').on(table.ownerId, table.deletedAt, table.savedAt, table.id),
  ],
);
