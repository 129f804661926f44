import { resolve } from 'node:path';
import { inspectBackup, mayRestore, NotABackup } from '#server/backups/backup-file';
import { runCommand } from '#server/setup/run-command';
import { CannotRestore, replaceRows } from '#server/backups/restoring';
import { readEveryStudy, withConnection } from '#server/backups/tables';
import { inTrialDatabase } from '#server/backups/trial-database';
import { readSettings } from '#server/env';
import { withAccess } from '#server/setup/command';

const USAGE = `npm run restore -- backups/siltline-20261201T120000Z.sql.gz
Puts what the backup holds in place of what the database holds. Take a backup first: what came since is gone then.
Everybody signs in again; mail that was sent since is not sent again.`;

async function run(file: string): Promise<void> {
  const settings = readSettings(process.env);
  const head = await inspectBackup(file);
  if (!mayRestore(head.mode, settings.mode))
    throw new CannotRestore(
      'The demo and a database in earnest do not mix: everybody knows the passwords of the demo.',
    );
  const restored = await withAccess(settings, (live) =>
    inTrialDatabase(file, async (trial) => {
      await withConnection(trial, readEveryStudy);
      return replaceRows(trial, live.migration);
    }),
  );
  console.log(`Restored as of ${head.takenAt}, and compared with the backup:`);
  for (const { table, rows } of restored) console.log(`  ${table.padEnd(24)} ${rows}`);
}

const [file] = process.argv.slice(2);
if (file === undefined) {
  console.error(USAGE);
  process.exit(1);
}
await runCommand(() => run(resolve(file)), [NotABackup, CannotRestore]);
