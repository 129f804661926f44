/**
 * Every test there is: types, lint and format, then unit, component, API and operations, then the browser.
 * The last line is `N passed, N failed`; the exit code is 0 only if nothing failed and nothing was left out.
 */
import { spawn } from 'node:child_process';
import { mkdirSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { withLock } from '../server/setup/process-lock.mjs';

const ROOT = fileURLToPath(new URL('..', import.meta.url));
const results = mkdtempSync(join(tmpdir(), 'siltline-results-'));
const children = new Set();
let interrupted = false;

for (const signal of ['SIGINT', 'SIGTERM'])
  process.on(signal, () => {
    interrupted = true;
    for (const child of children) child.kill(signal);
  });

/** @returns the exit code and, unless it is shown at once, what was said. */
function run(words, { shown, env = {} }) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, words, {
      cwd: ROOT,
      env: { ...process.env, ...env },
      stdio: ['ignore', shown ? 'inherit' : 'pipe', shown ? 'inherit' : 'pipe'],
    });
    children.add(child);
    const said = [];
    child.stdout?.on('data', (part) => said.push(part));
    child.stderr?.on('data', (part) => said.push(part));
    child.on('close', (code) => {
      children.delete(child);
      resolve({ code: interrupted ? 1 : (code ?? 1), said: Buffer.concat(said).toString() });
    });
  });
}

function readResult(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}

/** A run that failed without a failed test (a crash, a file that cannot be read) is one failure. */
function settle(name, code, { passed, failed, left }) {
  if (left > 0) console.log(`${name}: ${left} left out, which counts as failed`);
  const counted = failed + left;
  return { name, passed, failed: code !== 0 && counted === 0 ? 1 : counted };
}

const CHECKS = {
  types: ['node_modules/vue-tsc/bin/vue-tsc.js', '--build'],
  lint: [
    'node_modules/eslint/bin/eslint.js',
    '--max-warnings',
    '0',
    '--cache',
    '--cache-location',
    '.cache/eslint',
    '.',
  ],
  format: [
    'node_modules/prettier/bin/prettier.cjs',
    ...['--check', '--cache', '--cache-location', '.cache/prettier', '--log-level', 'warn', '.'],
  ],
};

async function check(name, words) {
  const { code, said } = await run(words, { shown: false });
  console.log(`${name}: ${code === 0 ? 'passed' : `failed\n${said}`}`);
  return { name, passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 };
}

/** They write to one cache: of two runs in one folder the second waits here. */
function checks() {
  mkdirSync(join(ROOT, '.cache'), { recursive: true });
  const waiting = (pid) => console.log(`another run (process ${pid}) is checking; waiting for it`);
  return withLock(join(ROOT, '.cache', 'checks.lock'), waiting, () =>
    Promise.all(Object.entries(CHECKS).map(([name, words]) => check(name, words))),
  );
}

async function vitest() {
  const file = join(results, 'vitest.json');
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${file}`];
  const { code } = await run(['node_modules/vitest/vitest.mjs', 'run', ...reporters], { shown: true });
  const result = readResult(file);
  if (!result) return settle('vitest', 1, { passed: 0, failed: 0, left: 0 });
  const unread = result.testResults.filter(
    ({ status, assertionResults }) =>
      status === 'failed' && !assertionResults.some((assertion) => assertion.status === 'failed'),
  );
  return settle('vitest', code, {
    passed: result.numPassedTests,
    failed: result.numFailedTests + unread.length,
    left: result.numPendingTests + (result.numTodoTests ?? 0),
  });
}

async function browser() {
  const file = join(results, 'browser.json');
  const env = { E2E_RESULT: file, E2E_ARTIFACTS: join(results, 'browser') };
  const { code } = await run(['node_modules/@playwright/test/cli.js', 'test'], { shown: true, env });
  const stats = readResult(file)?.stats;
  if (!stats) return settle('browser', 1, { passed: 0, failed: 0, left: 0 });
  return settle('browser', code, {
    passed: stats.expected,
    failed: stats.unexpected + stats.flaky,
    left: stats.skipped,
  });
}

const parts = await checks();
for (const part of [vitest, browser]) if (!interrupted) parts.push(await part());
const sum = (key) => parts.reduce((total, part) => total + part[key], 0);
const failing = parts.filter(({ failed }) => failed > 0).map(({ name }) => name);

console.log(failing.length > 0 ? `\nfailed in: ${failing.join(', ')}` : '');
if (interrupted) console.log('interrupted: not everything was run');
if (failing.includes('browser')) console.log(`traces and pictures: ${join(results, 'browser')}`);
else rmSync(results, { recursive: true, force: true });
console.log(`${sum('passed')} passed, ${sum('failed')} failed`);
process.exitCode = failing.length > 0 || interrupted ? 1 : 0;
