import { execFile } from 'node:child_process';
import { existsSync } from 'node:fs';
import { mkdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import { promisify } from 'node:util';
import {
  credentialsSchema,
  firstStatements,
  makeCredentials,
  type Credentials,
} from '#server/setup/mariadb/accounts';
import type { MariadbFiles } from '#server/setup/mariadb/files';
import { asRoot, findProgram } from '#server/setup/mariadb/programs';

const run = promisify(execFile);
const OWNER_ONLY = 0o600;
const FOLDER_OWNER_ONLY = 0o700;

/**
 * Makes the database's files unless they are there. Everything is made under another name and renamed at the end,
 * so that what was interrupted is begun anew and never half used.
 */
export async function initialiseMariadb({ data, credentials }: MariadbFiles): Promise<Credentials> {
  if (existsSync(data)) return credentialsSchema.parse(JSON.parse(await readFile(credentials, 'utf8')));
  const made = makeCredentials();
  const unfinished = `${data}.new`;
  const statements = `${data}.first.sql`;
  await rm(unfinished, { recursive: true, force: true });
  await mkdir(unfinished, { mode: FOLDER_OWNER_ONLY });
  await rm(credentials, { force: true });
  await writeFile(credentials, JSON.stringify(made), { mode: OWNER_ONLY });
  await rm(statements, { force: true });
  await writeFile(statements, firstStatements(made), { mode: OWNER_ONLY });
  try {
    await install(unfinished, statements);
  } finally {
    await rm(statements, { force: true });
  }
  await rename(unfinished, data);
  return made;
}

async function install(data: string, statements: string): Promise<void> {
  await run(findProgram('mariadb-install-db'), [
    '--no-defaults',
    ...asRoot(),
    `--datadir=${data}`,
    '--auth-root-authentication-method=normal',
    '--skip-test-db',
    '--skip-name-resolve',
    `--extra-file=${statements}`,
    '--innodb-log-file-size=16M',
  ]);
}
