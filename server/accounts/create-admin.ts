import { CannotCreate, createAdministrator } from '#server/accounts/administrators.service';
import { createPasswords } from '#server/accounts/passwords';
import { randomSecret } from '#server/accounts/secrets';
import { openDb, openPool } from '#server/db/connection';
import { readSettings, SettingsError } from '#server/env';
import { createClosing } from '#server/setup/closing';
import { CannotStart } from '#server/setup/data-folder';
import { openDatabase } from '#server/setup/database';
import { createLogger } from '#server/setup/logger';
import { migrateDatabase } from '#server/setup/migration';

const USAGE = `npm run admin:create -- somebody@example "Their Name"
Takes the same settings as the program. The password is ADMIN_PASSWORD, or is made and shown once.`;

/** `npm run admin:create`: with the embedded database the program must not be running, as it holds the data folder. */
async function run(email: string, name: string): Promise<void> {
  const settings = readSettings(process.env);
  const log = createLogger({ logLevel: 'warn' });
  const closing = createClosing();
  try {
    const database = await openDatabase(settings, log);
    closing.add(database.stop);
    await migrateDatabase(database.migration);
    const pool = openPool(database.app);
    closing.add(() => pool.end());
    const passwords = createPasswords();
    closing.add(passwords.close);
    const given = process.env.ADMIN_PASSWORD ?? '';
    const password = given === '' ? randomSecret() : given;
    await createAdministrator(
      { db: openDb(pool), clock: () => new Date(), passwords },
      { email, name, password },
    );
    console.log(`${email} is an administrator now.`);
    if (given === '') console.log(`The password, shown this once: ${password}`);
  } finally {
    await closing.run((error) => console.error(error));
  }
}

const [email, name] = process.argv.slice(2);
if (email === undefined || name === undefined) {
  console.error(USAGE);
  process.exit(1);
}
try {
  await run(email, name);
  process.exit(0);
} catch (error) {
  const forOperators =
    error instanceof SettingsError || error instanceof CannotStart || error instanceof CannotCreate;
  console.error(forOperators ? error.message : error);
  process.exit(1);
}
