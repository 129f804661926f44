import { mysqlTable, mysqlEnum } from 'drizzle-orm/mysql-core';
import { ROLES } from '#shared/contracts/accounts';
import { EMAIL_LENGTH, exactText, ID_LENGTH, idText, peopleText, time } from '#server/db/columns';

const BCRYPT_LENGTH = 60;

export const accounts = mysqlTable('accounts', {
  id: idText({ length: ID_LENGTH }).primaryKey(),
  /** Normalised: see `normaliseEmail`. */
  email: exactText({ length: EMAIL_LENGTH }).notNull().unique(),
  name: peopleText({ length: 80 }).notNull(),
  role: mysqlEnum(ROLES).notNull(),
  passwordHash: idText('password_hash', { length: BCRYPT_LENGTH }).notNull(),
  /** Null until the link in the mail was used: until then nobody can sign in. */
  confirmedAt: time('confirmed_at'),
  createdAt: time('created_at').notNull(),
});
