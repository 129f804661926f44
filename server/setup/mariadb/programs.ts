import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';

/** Debian keeps servers where an ordinary user's PATH does not look. */
const FOLDERS = [...(process.env.PATH ?? '').split(delimiter), '/usr/sbin', '/usr/local/sbin'];

/** Debian's packages of the programs that are used. */
const PACKAGES = {
  mariadbd: 'mariadb-server-core',
  'mariadb-install-db': 'mariadb-server-core',
  mariadb: 'mariadb-client-core',
  'mariadb-dump': 'mariadb-client',
} as const;

/** @throws {Error} if the machine has no such program. */
export function findProgram(name: keyof typeof PACKAGES): string {
  for (const folder of FOLDERS) {
    const file = join(folder, name);
    try {
      accessSync(file, constants.X_OK);
      return file;
    } catch {
      continue;
    }
  }
  throw new Error(`${name} is not on this machine: install ${PACKAGES[name]}.`);
}

/** MariaDB wants to be told that it may run as root. */
export function asRoot(): readonly string[] {
  return process.getuid?.() === 0 ? ['--user=root'] : [];
}
