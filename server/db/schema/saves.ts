import { index, int, json, mysqlEnum, mysqlTable, primaryKey, uniqueIndex } from 'drizzle-orm/mysql-core';
import { ID_LENGTH, idText, peopleText, time } from '#server/db/columns';
import { accounts } from '#server/db/schema/accounts';
import { studies } from '#server/db/schema/studies';

export const SAVE_KINDS = ['accepted', 'set-aside'] as const;
export type SaveKind = (typeof SAVE_KINDS)[number];

export const VERSION_NAME_LENGTH = 80;

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
    /** The page it was edited in: saves of one stretch of editing show as one version. */
    deviceKey: idText('device_key', { length: ID_LENGTH }),
    /** What was sent, where the document is a merge of it with what others had saved, and what those had brought. */
    merge: json(),
    /** Given by a person: such a save is kept for good. */
    name: peopleText({ length: VERSION_NAME_LENGTH }),
  },
  (table) => [
    primaryKey({ columns: [table.studyId, table.kind, table.number] }),
    uniqueIndex('saves_request').on(table.studyId, table.savedBy, table.requestKey),
    index('saves_age').on(table.kind, table.savedAt),
  ],
);
