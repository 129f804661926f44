import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { realpathSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { setTimeout as pause } from 'node:timers/promises';
import { freePort } from './port';

/** The built program, running as a process of its own. */
export interface Product {
  readonly url: string;
  readonly child: ChildProcess;
  /** All that it has said so far. */
  output(): string;
  /** Sends the signal and waits for the end. */
  end(signal?: NodeJS.Signals): Promise<Ended>;
}

export interface Ended {
  readonly code: number | null;
  readonly signal: NodeJS.Signals | null;
  readonly output: string;
}

type Settings = Readonly<Record<string, string>>;

const POLL_MS = 50;
const BUILT = fileURLToPath(new URL('../../dist/current/server/start.js', import.meta.url));

/** Nothing of this process's own settings reaches the program. */
function launch(settings: Settings): { child: ChildProcess; output: () => string; ended: Promise<Ended> } {
  const { PATH = '', HOME = '' } = process.env;
  const child = spawn(process.execPath, [realpathSync(BUILT)], {
    env: { PATH, HOME, ...settings },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let said = '';
  const listen = (part: Buffer) => (said += part.toString());
  child.stdout.on('data', listen);
  child.stderr.on('data', listen);
  const ended = once(child, 'close').then((): Ended => ({
    code: child.exitCode,
    signal: child.signalCode,
    output: said,
  }));
  return { child, output: () => said, ended };
}

/**
 * Starts the built program on a free port and waits until it is well.
 * @throws {Error} with what it said, if it ends instead.
 */
export async function startProduct(settings: Settings & { readonly DATA_DIR: string }): Promise<Product> {
  const port = settings.PORT ?? String(await freePort());
  const { child, output, ended } = launch({ ...settings, PORT: port });
  const url = `http://localhost:${port}`;
  while (!(await isWell(url))) {
    if (child.exitCode !== null || child.signalCode !== null)
      throw new Error(`The program ended as it started:\n${output()}`);
    await pause(POLL_MS);
  }
  const end = (signal: NodeJS.Signals = 'SIGTERM') => {
    child.kill(signal);
    return ended;
  };
  return { url, child, output, end };
}

/** Runs the built program with settings that it refuses, to its end. */
export async function runToEnd(settings: Settings): Promise<Ended> {
  const port = settings.PORT ?? String(await freePort());
  return launch({ ...settings, PORT: port }).ended;
}

/** @returns the status of the program's answer about its health, or undefined if nobody answers. */
export async function healthStatus(url: string): Promise<number | undefined> {
  try {
    return (await fetch(`${url}/api/health`)).status;
  } catch {
    return undefined;
  }
}

async function isWell(url: string): Promise<boolean> {
  return (await healthStatus(url)) === 200;
}
