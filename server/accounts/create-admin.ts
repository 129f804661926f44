import { CannotCreate, createAdministrator } from '#server/accounts/administrators.service';
import { createPasswords } from '#server/accounts/passwords';
import { randomSecret } from '#server/accounts/secrets';
import { readSettings } from '#server/env';
import { withDatabase } from '#server/setup/command';
import { runCommand } from '#server/setup/run-command';

const USAGE = `npm run admin:create -- somebody@example "Their Name"
Takes the same settings as the program. The password is ADMIN_PASSWORD, or is made and shown once.`;

async function run(email: string, name: string): Promise<void> {
  const given = process.env.ADMIN_PASSWORD ?? '';
  const password = given === '' ? randomSecret() : given;
  const passwords = createPasswords();
  try {
    await withDatabase(readSettings(process.env), (db) =>
      createAdministrator({ db, clock: () => new Date(), passwords }, { email, name, password }),
    );
  } finally {
    await passwords.close();
  }
  console.log(`${email} is an administrator now.`);
  if (given === '') console.log(`The password, shown this once: ${password}`);
}

const [email, name] = process.argv.slice(2);
if (email === undefined || name === undefined) {
  console.error(USAGE);
  process.exit(1);
}
await runCommand(() => run(email, name), [CannotCreate]);
