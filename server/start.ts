import { createApp } from '#server/app';
import { composeDeps } from '#server/compose';
import { readSettings, SettingsError, type Settings } from '#server/env';
import { describeError } from '#server/http/describe-error';
import { createClosing } from '#server/setup/closing';
import { CannotStart } from '#server/setup/data-folder';
import { leaseBuild } from '#server/setup/lease';
import { checkAddress, closeServer, listen } from '#server/setup/listen';
import { createLogger } from '#server/setup/logger';
import { untilAskedToStop } from '#server/setup/signals';

/** Requests under way are given so long to finish; the whole stop then stays within about ten seconds. */
const PATIENCE_MS = 7000;

function greeting({ mode, host, port, publicUrl, withoutEffect }: Settings): string {
  const lines = [`Siltline is ready: ${publicUrl}`];
  if (mode === 'demo') lines.push('This is the demonstration; the sign-in page says how to enter.');
  if (new URL(publicUrl).port !== String(port)) lines.push(`It listens on ${host}:${port}.`);
  if (withoutEffect.length > 0)
    lines.push(`Without effect in the demonstration: ${withoutEffect.join(', ')}.`);
  return lines.join('\n');
}

/** Runs until it is asked to stop. @throws whatever keeps it from starting. */
async function run(settings: Settings): Promise<void> {
  const log = createLogger(settings);
  const stop = untilAskedToStop();
  const closing = createClosing();
  try {
    closing.add(leaseBuild());
    await checkAddress(settings.host, settings.port);
    const deps = await composeDeps(settings, log, closing);
    const server = await listen(createApp(deps), settings.host, settings.port);
    closing.add(() => closeServer(server, PATIENCE_MS));
    console.log(greeting(settings));
    log.info({ signal: await stop }, 'stopping');
  } finally {
    await closing.run((error) => log.error({ err: error }, 'something could not be closed in order'));
  }
}

try {
  await run(readSettings(process.env));
  process.exit(0);
} catch (error) {
  const forOperators = error instanceof SettingsError || error instanceof CannotStart;
  console.error(forOperators ? error.message : describeError(error));
  process.exit(1);
}
