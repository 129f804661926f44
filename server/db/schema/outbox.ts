import { index, int, mysqlTable } from 'drizzle-orm/mysql-core';
import { EMAIL_LENGTH, exactText, ID_LENGTH, idText, longText, peopleText, time } from '#server/db/columns';

/** Mail to be sent, written in the transaction of its cause. */
export const outbox = mysqlTable(
  'outbox',
  {
    id: idText({ length: ID_LENGTH }).primaryKey(),
    toEmail: exactText('to_email', { length: EMAIL_LENGTH }).notNull(),
    toName: peopleText('to_name', { length: 80 }).notNull(),
    subject: peopleText({ length: 300 }).notNull(),
    text: longText().notNull(),
    html: longText().notNull(),
    createdAt: time('created_at').notNull(),
    attempts: int().notNull().default(0),
    /** Null once it is sent or given up. */
    dueAt: time('due_at'),
    sentAt: time('sent_at'),
    givenUpAt: time('given_up_at'),
    /** The server's last answer code; never its text, which may quote the mail. */
    lastFault: idText('last_fault', { length: 40 }),
  },
  (table) => [index('outbox_due').on(table.dueAt)],
);
