import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { isBuilt, makeBuild } from './build.mjs';
import { CHROMIUM, DUMP, installPackages, isInstalled, MARIADB } from './debian.mjs';
import { dependenciesAreComplete, installDependencies } from './dependencies.mjs';
import { withLock } from './process-lock.mjs';
import { CannotSetUp, say } from './report.mjs';
import { ROOT } from './sources.mjs';

const dependencies = { isDone: dependenciesAreComplete, run: installDependencies };
const build = { isDone: isBuilt, run: makeBuild };
const program = (needed) => ({ isDone: () => isInstalled(needed), run: () => installPackages(needed) });

/** A database of yours needs no database server here. */
const ownDatabase = () => (process.env.DATABASE_URL ? [] : [program(MARIADB)]);

const STEPS = {
  start: () => [dependencies, ...ownDatabase(), build],
  dev: () => [dependencies, ...ownDatabase()],
  build: () => [dependencies, build],
  backup: () => [dependencies, program(MARIADB), program(DUMP)],
  test: () => [dependencies, program(MARIADB), program(DUMP), program(CHROMIUM), build],
};

/** Does what is missing, and nothing twice at once. @returns the exit code. */
export async function prepare(purpose) {
  const steps = STEPS[purpose]?.();
  if (!steps) {
    console.error(`usage: bootstrap.mjs ${Object.keys(STEPS).join('|')}`);
    return 1;
  }
  try {
    if (steps.every((step) => step.isDone())) return 0;
    mkdirSync(join(ROOT, '.cache'), { recursive: true });
    const waiting = (pid) => say(`another copy (process ${pid}) is being set up; waiting for it`);
    await withLock(join(ROOT, '.cache', 'setup.lock'), waiting, async () => {
      for (const step of steps) if (!step.isDone()) await step.run();
    });
    return 0;
  } catch (error) {
    console.error(error instanceof CannotSetUp ? `Siltline: ${error.message}` : error);
    return 1;
  }
}
