import { index, json, mysqlTable, uniqueIndex } from 'drizzle-orm/mysql-core';
import { ID_LENGTH, idText, peopleText, time } from '#server/db/columns';
import { accounts } from '#server/db/schema/accounts';

export const VOICING_NAME_LENGTH = 80;

/** Voicings that a person keeps, to use again in any key. */
export const shelf = mysqlTable(
  'shelf',
  {
    id: idText({ length: ID_LENGTH }).primaryKey(),
    ownerId: idText('owner_id', { length: ID_LENGTH })
      .notNull()
      .references(() => accounts.id, { onDelete: 'cascade' }),
    name: peopleText({ length: VOICING_NAME_LENGTH }).notNull(),
    /** The chord with the key and the ensemble that it was kept under. */
    voicing: json().notNull(),
    keptAt: time('kept_at').notNull(),
    requestKey: idText('request_key', { length: ID_LENGTH }).notNull(),
  },
  (table) => [
    uniqueIndex('shelf_request').on(table.ownerId, table.requestKey),
    index('shelf_owner_newest').on(table.ownerId, table.keptAt, table.id),
  ],
);
