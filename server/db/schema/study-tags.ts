import { index, mysqlTable, primaryKey } from 'drizzle-orm/mysql-core';
import { ID_LENGTH, idText, peopleText } from '#server/db/columns';
import { accounts } from '#server/db/schema/accounts';
import { studies } from '#server/db/schema/studies';

export const TAG_LENGTH = 40;

/** Words by which a person finds studies again; each person's own, on studies of others too. */
export const studyTags = mysqlTable(
  'study_tags',
  {
    accountId: idText('account_id', { length: ID_LENGTH })
      .notNull()
      .references(() => accounts.id, { onDelete: 'cascade' }),
    studyId: idText('study_id', { length: ID_LENGTH })
      .notNull()
      .references(() => studies.id, { onDelete: 'cascade' }),
    tag: peopleText({ length: TAG_LENGTH }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.accountId, table.studyId, table.tag] }),
    index('study_tags_tag').on(table.accountId, table.tag, table.studyId),
  ],
);
