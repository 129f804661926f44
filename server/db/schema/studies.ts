import { boolean, double, index, int, json, mysqlTable, uniqueIndex } from 'drizzle-orm/mysql-core';
import { ID_LENGTH, idText, peopleText, time } from '#server/db/columns';
import { accounts } from '#server/db/schema/accounts';

export const TITLE_LENGTH = 120;
export const ABOUT_LENGTH = 2000;
const TONIC_LENGTH = 2;
const MODE_LENGTH = 12;

/** A figure that is not worked out yet stands behind all others. */
export const NOT_YET_KNOWN = -1;

/** What of its newest document a study is found, sorted and shown by in a table stands in columns of its own. */
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
    title: peopleText({ length: TITLE_LENGTH }).notNull().default(''),
    about: peopleText({ length: ABOUT_LENGTH }).notNull().default(''),
    keyTonic: idText('key_tonic', { length: TONIC_LENGTH }).notNull().default(''),
    keyMode: idText('key_mode', { length: MODE_LENGTH }).notNull().default(''),
    chordCount: int('chord_count').notNull().default(0),
    /** The index of its cloudiest chord. */
    cloudiest: double().notNull().default(NOT_YET_KNOWN),
    /** Muddiness by register of each chord. */
    summary: json(),
    /** Whether the newest save is not summed up yet. */
    summaryDue: boolean('summary_due').notNull().default(true),
  },
  (table) => [
    uniqueIndex('studies_request').on(table.ownerId, table.requestKey),
    index('studies_owner_newest').on(table.ownerId, table.deletedAt, table.savedAt, table.id),
    index('studies_owner_title').on(table.ownerId, table.deletedAt, table.title, table.id),
    index('studies_owner_cloudiest').on(table.ownerId, table.deletedAt, table.cloudiest, table.id),
    index('studies_summary_due').on(table.summaryDue),
    index('studies_deleted').on(table.deletedAt),
  ],
);
