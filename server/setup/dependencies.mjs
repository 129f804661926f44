import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { CannotSetUp, say } from './report.mjs';
import { ROOT } from './sources.mjs';

/** npm writes this last, so it tells what is installed and that the installation came to its end. */
const INSTALLED = join(ROOT, 'node_modules', '.package-lock.json');

/** npm's own settings for this machine; the rest of what an npm that runs us sets would confuse another. */
const KEPT_SETTINGS =
  /^npm_config_(registry|cache|userconfig|globalconfig|proxy|https_proxy|noproxy|cafile|ca)$/i;

function packagesIn(file) {
  return JSON.parse(readFileSync(file, 'utf8')).packages;
}

/** @returns whether every library stands in its locked version; those for other systems may be missing. */
export function dependenciesAreComplete() {
  if (!existsSync(INSTALLED)) return false;
  const installed = packagesIn(INSTALLED);
  return Object.entries(packagesIn(join(ROOT, 'package-lock.json'))).every(
    ([path, { version, optional }]) => {
      if (path === '' || (optional && !installed[path])) return true;
      return installed[path]?.version === version && existsSync(join(ROOT, path, 'package.json'));
    },
  );
}

function environment() {
  const kept = ([name]) => KEPT_SETTINGS.test(name) || !(/^npm_/i.test(name) || name === 'NODE_ENV');
  return Object.fromEntries(Object.entries(process.env).filter(kept));
}

export function installDependencies() {
  say('installing the libraries, about half a minute');
  // Whatever interrupts the installation, it is then known to be incomplete.
  rmSync(INSTALLED, { force: true });
  const npm = process.env.npm_execpath ? [process.execPath, process.env.npm_execpath] : ['npm'];
  const [command, ...words] = [...npm, 'ci', '--include=dev', '--prefer-offline', '--loglevel=error'];
  const { status, error } = spawnSync(command, words, {
    cwd: ROOT,
    env: environment(),
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  if (status !== 0)
    throw new CannotSetUp(
      `the libraries could not be installed (${error?.message ?? `npm ci ended with ${status}`}). ` +
        'Is the npm registry reachable?',
    );
}
