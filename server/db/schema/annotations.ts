import { index, mysqlTable, uniqueIndex } from 'drizzle-orm/mysql-core';
import { ID_LENGTH, idText, longText, time } from '#server/db/columns';
import { accounts } from '#server/db/schema/accounts';
import { studies } from '#server/db/schema/studies';

export const annotations = mysqlTable(
  'annotations',
  {
    id: idText({ length: ID_LENGTH }).primaryKey(),
    studyId: idText('study_id', { length: ID_LENGTH })
      .notNull()
      .references(() => studies.id, { onDelete: 'cascade' }),
    authorId: idText('author_id', { length: ID_LENGTH })
      .notNull()
      .references(() => accounts.id, { onDelete: 'cascade' }),
    /** Null: the annotation hangs on the study as a whole. */
    chordId: idText('chord_id', { length: ID_LENGTH }),
    text: longText().notNull(),
    writtenAt: time('written_at').notNull(),
    requestKey: idText('request_key', { length: ID_LENGTH }).notNull(),
  },
  (table) => [
    uniqueIndex('annotations_request').on(table.studyId, table.authorId, table.requestKey),
    index('annotations_study').on(table.studyId, table.writtenAt, table.id),
  ],
);
