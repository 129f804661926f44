import { randomBytes } from 'node:crypto';
import { z } from 'zod';

/** The names of the embedded database and its accounts. */
export const DATABASE = 'siltline';
const APP_USER = 'siltline_app';
const MIGRATION_USER = 'siltline_migration';

const PASSWORD_BYTES = 24;

/** Kept in the data folder, readable by its owner alone. */
export const credentialsSchema = z.object({
  app: z.object({ user: z.string(), password: z.string() }),
  migration: z.object({ user: z.string(), password: z.string() }),
});
export type Credentials = z.infer<typeof credentialsSchema>;

export function makeCredentials(): Credentials {
  const password = () => randomBytes(PASSWORD_BYTES).toString('base64url');
  return {
    app: { user: APP_USER, password: password() },
    migration: { user: MIGRATION_USER, password: password() },
  };
}

/**
 * What a new database server is told first. No account remains but the two: no superuser, with or without a
 * password. The one that serves requests can neither change tables nor read files.
 * base64url passwords hold no quote, so they may stand in the text.
 */
export function firstStatements({ app, migration }: Credentials): string {
  return [
    'FLUSH PRIVILEGES;',
    "DELETE FROM mysql.global_priv WHERE User <> 'mariadb.sys';",
    'FLUSH PRIVILEGES;',
    `CREATE DATABASE ${DATABASE} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;`,
    `CREATE USER ${app.user}@localhost IDENTIFIED BY '${app.password}';`,
    `GRANT SELECT, INSERT, UPDATE, DELETE ON ${DATABASE}.* TO ${app.user}@localhost;`,
    `CREATE USER ${migration.user}@localhost IDENTIFIED BY '${migration.password}';`,
    `GRANT ALL PRIVILEGES ON ${DATABASE}.* TO ${migration.user}@localhost;`,
    '',
  ].join('\n');
}
