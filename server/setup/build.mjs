import { cpSync, existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { basename, join } from 'node:path';
import { DIST, pointCurrentAt, isCurrent, prune, UNFINISHED } from './builds.mjs';
import { CannotSetUp, say } from './report.mjs';
import { ROOT, sourcesBelow, sourcesHash } from './sources.mjs';

const ATTEMPTS = 3;

export function isBuilt() {
  return isCurrent(sourcesHash());
}

/** What is started by itself: the server, the commands, and the worker threads. */
function entries() {
  const own = /^server\/(start|.*\.worker|.*\/create-admin)\.ts$/;
  const files = sourcesBelow('server').filter((file) => own.test(file));
  return Object.fromEntries(files.map((file) => [basename(file, '.ts'), join(ROOT, file)]));
}

async function buildInto(folder) {
  const { build } = await import('vite');
  const common = { root: ROOT, logLevel: 'warn', mode: 'production' };
  await build({ ...common, build: { outDir: join(folder, 'client'), emptyOutDir: true } });
  await build({
    ...common,
    configFile: false,
    publicDir: false,
    // The libraries are built in: a running copy does not miss them while others are installed.
    ssr: { noExternal: true },
    define: { 'process.env.NODE_ENV': JSON.stringify('production') },
    build: {
      ssr: true,
      target: 'node20',
      outDir: join(folder, 'server'),
      rolldownOptions: {
        input: entries(),
        output: { entryFileNames: '[name].js', chunkFileNames: 'part-[name]-[hash].js' },
      },
    },
  });
  cpSync(join(ROOT, 'drizzle'), join(folder, 'drizzle'), { recursive: true });
  const { name, version, type } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8'));
  writeFileSync(join(folder, 'package.json'), JSON.stringify({ name, version, type }));
}

/**
 * Builds the sources as they are into a folder of their own, unless it is there, and makes it the current one. A copy
 * that runs keeps the folder that it was started from.
 */
export async function makeBuild() {
  for (let attempt = 0; attempt < ATTEMPTS; attempt += 1) {
    const hash = sourcesHash();
    const target = join(DIST, hash);
    if (!existsSync(target)) {
      say('building the program');
      const unfinished = join(DIST, `${UNFINISHED}${process.pid}`);
      rmSync(unfinished, { recursive: true, force: true });
      mkdirSync(unfinished, { recursive: true });
      await buildInto(unfinished);
      if (sourcesHash() !== hash) continue;
      renameSync(unfinished, target);
    }
    pointCurrentAt(hash);
    prune(hash);
    return;
  }
  throw new CannotSetUp('the sources changed each time while they were being built.');
}
