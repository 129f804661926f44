import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { z } from 'zod';

const here = fileURLToPath(import.meta.url);
const packageSchema = z.object({ version: z.string() });

/** Whether this is the built program, which has its parts beside it, or runs from its sources. */
export const isBuilt = !here.endsWith('.ts');
/** The folder of the program's parts: dist/<hash>, or the repository. */
export const productFolder = isBuilt ? join(dirname(here), '..') : join(dirname(here), '../..');
/** The pages to serve; from the sources Vite serves them. */
export const clientFolder: string | undefined = isBuilt ? join(productFolder, 'client') : undefined;
export const migrationsFolder = join(productFolder, 'drizzle');
export const version = packageSchema.parse(
  JSON.parse(readFileSync(join(productFolder, 'package.json'), 'utf8')),
).version;
