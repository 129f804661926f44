import { int, json, mysqlEnum, mysqlTable, primaryKey, uniqueIndex } from 'drizzle-orm/mysql-core';
import { ID_LENGTH, idText, time } from '#server/db/columns';
import { accounts } from '#server/db/schema/accounts';
import { studies } from '#server/db/schema/studies';

export const SAVE_KINDS = ['accepted', 'set-aside'] as const;
export type SaveKind = (typeof SAVE_KINDS)[number];

/** Every document that was ever sent to be kept. */
export const saves = mysqlTable(
  'saves',
  {
    studyId: idText('study_id', { length: ID_LENGTH })
      .notNull()
      .references(() => studies.id, { onDelete: 'cascade' }),
    kind: mysqlEnum(SAVE_KINDS).notNull(),
    number: int().notNull(),
    /** The accepted save that it began from; 0 for the first. */
    basedOn: int('based_on').notNull(),
    document: json().notNull(),
    savedBy: idText('saved_by', { length: ID_LENGTH })
      .notNull()
      .references(() => accounts.id),
    savedAt: time('saved_at').notNull(),
    requestKey: idText('request_key', { length: ID_LENGTH }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.studyId, table.kind, table.number] }),
    uniqueIndex('saves_request').on(table.studyId, table.savedBy, table.requestKey),
  ],
);
