import { spawnSync } from 'node:child_process';
import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { CannotSetUp, say } from './report.mjs';

export const MARIADB = {
  what: 'the database server',
  program: 'mariadbd',
  packages: ['mariadb-server-core', 'mariadb-client-core'],
};
export const DUMP = {
  what: 'the program for backups',
  program: 'mariadb-dump',
  packages: ['mariadb-client'],
};
export const CHROMIUM = { what: 'the browser for the tests', program: 'chromium', packages: ['chromium'] };

/** Others may be installing too. */
const LOCK_WAIT_S = 180;

/** Debian keeps servers where an ordinary user's PATH does not look. */
function has(program) {
  const folders = [...(process.env.PATH ?? '').split(delimiter), '/usr/sbin', '/usr/local/sbin'];
  return folders.some((folder) => {
    try {
      accessSync(join(folder, program), constants.X_OK);
      return true;
    } catch {
      return false;
    }
  });
}

export function isInstalled({ program }) {
  return has(program);
}

function asRoot(words) {
  const prefix = process.getuid?.() === 0 ? [] : ['sudo', '-n'];
  const [command, ...rest] = [...prefix, 'env', 'DEBIAN_FRONTEND=noninteractive', ...words];
  return spawnSync(command, rest, { stdio: ['ignore', 'ignore', 'inherit'] }).status === 0;
}

export function installPackages(needed) {
  const { what, packages } = needed;
  const install = ['apt-get', 'install', '-y', '-qq', '--no-install-recommends'];
  const apt = () => asRoot([...install, '-o', `DPkg::Lock::Timeout=${LOCK_WAIT_S}`, ...packages]);
  const byHand = `install ${packages.join(' ')} yourself (as root: apt-get install ${packages.join(' ')})`;
  const mayInstall = has('apt-get') && (process.getuid?.() === 0 || has('sudo'));
  if (!mayInstall) throw new CannotSetUp(`${what} is missing and cannot be installed from here: ${byHand}.`);
  say(`installing ${what} (${packages.join(', ')})`);
  if (apt()) return;
  // An installation that was cut off, or lists of packages that are old or missing.
  asRoot(['dpkg', '--configure', '-a']);
  asRoot(['apt-get', 'update', '-qq']);
  if (!apt() || !isInstalled(needed)) throw new CannotSetUp(`${what} could not be installed: ${byHand}.`);
}
