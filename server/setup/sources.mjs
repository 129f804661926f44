import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The repository. */
export const ROOT = fileURLToPath(new URL('../..', import.meta.url));

/** All that the built program is made from. */
const SOURCES = [
  'src',
  'shared',
  'server',
  'drizzle',
  'public',
  'index.html',
  'vite.config.ts',
  'package.json',
  'package-lock.json',
  'tsconfig.base.json',
];
const LENGTH = 16;

function filesBelow(path) {
  if (!existsSync(path)) return [];
  if (statSync(path).isFile()) return [path];
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesBelow(join(path, name)));
}

/** Lists the repository's files below a folder, by their paths from the repository. */
export function sourcesBelow(folder) {
  return filesBelow(join(ROOT, folder)).map((file) => relative(ROOT, file));
}

/** A name for the sources as they are: times of files say nothing after a checkout, contents do. */
export function sourcesHash() {
  const hash = createHash('sha256');
  for (const file of SOURCES.flatMap(sourcesBelow)) {
    hash.update(`${file}\0`);
    hash.update(
      createHash('sha256')
        .update(readFileSync(join(ROOT, file)))
        .digest(),
    );
  }
  return hash.digest('hex').slice(0, LENGTH);
}
