import type { Logger } from 'pino';
import { createApp } from '#server/app';
import { composeDeps } from '#server/compose';
import { readSettings, SettingsError, type Settings } from '#server/env';
import { describeError } from '#server/http/describe-error';
import { createClosing, type Closing } from '#server/setup/closing';
import { CannotStart } from '#server/setup/data-folder';
import { layGround, type Ground } from '#server/setup/ground';
import { leaseBuild } from '#server/setup/lease';
import { checkAddress, closeServer, listen } from '#server/setup/listen';
import { createLogger } from '#server/setup/logger';
import { isServerProcess, receiveGround, startProcesses } from '#server/setup/processes';
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

async function serve(settings: Settings, ground: Ground, log: Logger, closing: Closing): Promise<void> {
  const deps = composeDeps(settings, ground, log, closing);
  const server = await listen(createApp(deps), settings.host, settings.port);
  closing.add(() => closeServer(server, PATIENCE_MS));
}

/** Makes what all processes share, then serves: in this process, or in several of their own. */
async function begin(settings: Settings, log: Logger, closing: Closing): Promise<void> {
  await checkAddress(settings.host, settings.port);
  const ground = await layGround(settings, log, closing);
  if (settings.workers === 1) await serve(settings, ground, log, closing);
  else closing.add(await startProcesses(settings.workers, ground, log));
  console.log(greeting(settings));
}

/** Runs until it is asked to stop. @throws whatever keeps it from starting. */
async function run(settings: Settings): Promise<void> {
  const log = createLogger(settings);
  const stop = untilAskedToStop();
  const closing = createClosing();
  try {
    closing.add(leaseBuild());
    if (isServerProcess) await serve(settings, await receiveGround(), log, closing);
    else await begin(settings, log, closing);
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
