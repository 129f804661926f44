/**
 * The server and Vite, both reloading. The pages are at PORT, as they are in the built program; the server is one
 * port above, and Vite hands on to it what begins with /api.
 */
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { ROOT } from './sources.mjs';

const port = Number(process.env.PORT || '3000');
const env = {
  PUBLIC_URL: `http://localhost:${port}`,
  ...process.env,
  PORT: String(port + 1),
  PAGES_PORT: String(port),
};
const tool = (...path) => join(ROOT, 'node_modules', ...path);
const commands = [
  [tool('tsx', 'dist', 'cli.mjs'), 'watch', '--clear-screen=false', 'server/start.ts'],
  [tool('vite', 'bin', 'vite.js'), '--clearScreen', 'false'],
];

const children = commands.map((words) =>
  spawn(process.execPath, words, { cwd: ROOT, env, stdio: 'inherit' }),
);
let stopping = false;

/** Once: at a second signal the watcher kills the server in the middle of its closing. */
function stop(signal) {
  if (stopping) return;
  stopping = true;
  for (const child of children) child.kill(signal);
}

for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => stop(signal));
for (const child of children) child.on('exit', () => stop('SIGTERM'));
