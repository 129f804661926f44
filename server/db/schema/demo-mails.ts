import { bigint, index, mysqlTable } from 'drizzle-orm/mysql-core';
import { longText, peopleText, time } from '#server/db/columns';

/** What the demonstration's own mail server received. */
export const demoMails = mysqlTable(
  'demo_mails',
  {
    id: bigint({ mode: 'number', unsigned: true }).autoincrement().primaryKey(),
    to: peopleText({ length: 400 }).notNull(),
    from: peopleText({ length: 400 }).notNull(),
    subject: peopleText({ length: 300 }).notNull(),
    text: longText().notNull(),
    receivedAt: time('received_at').notNull(),
  },
  (table) => [index('demo_mails_received').on(table.receivedAt)],
);
