import { mkdir } from 'node:fs/promises';
import { join, resolve } from 'node:path';
import { inspectBackup, NotABackup, writeBackup } from '#server/backups/backup-file';
import { runCommand } from '#server/setup/run-command';
import { readEveryStudy, readTables, withConnection } from '#server/backups/tables';
import { inTrialDatabase } from '#server/backups/trial-database';
import { readSettings } from '#server/env';
import { withAccess } from '#server/setup/command';
import { version } from '#server/setup/product';

const FOLDER_OWNER_ONLY = 0o700;

/** `npm run backup -- [folder]`: one file, taken while the program runs, and tried out. */
async function run(folder: string): Promise<void> {
  const settings = readSettings(process.env);
  const takenAt = new Date().toISOString();
  await mkdir(folder, { recursive: true, mode: FOLDER_OWNER_ONLY });
  const file = join(folder, `siltline-${takenAt.replaceAll(/[-:]|\.\d+/g, '')}.sql.gz`);
  await withAccess(settings, ({ migration }) =>
    writeBackup(migration, file, { format: 1, mode: settings.mode, version, takenAt }),
  );
  await inspectBackup(file);
  const { tables, saves } = await inTrialDatabase(file, (trial) =>
    withConnection(trial, async (connection) => ({
      tables: await readTables(connection),
      saves: await readEveryStudy(connection),
    })),
  );
  console.log(`${file}`);
  for (const { table, rows } of tables) console.log(`  ${table.padEnd(24)} ${rows}`);
  console.log(`Tried out: loaded into an empty database, ${saves} saves of studies read.`);
}

const [folder] = process.argv.slice(2);
await runCommand(() => run(resolve(folder ?? 'backups')), [NotABackup]);
