/**
 * A lock file that names the process holding it. The lock of a process that died is taken over.
 * Node's built-ins only: the bootstrap uses it before anything is installed.
 */
import { linkSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';

/** To take over a dead process's lock takes microseconds: longer, and whoever did it died too. */
const TAKEOVER_MS = 5000;

/** When a process began, in the kernel's ticks: a process number alone may have been given out again. */
function startOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const boot = readFileSync('/proc/sys/kernel/random/boot_id', 'utf8').trim();
    const afterName = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    // Field 3 (state) comes first after the name; field 22 is the start time. A zombie has ended.
    return afterName[0] === 'Z' ? undefined : `${boot} ${afterName[19]}`;
  } catch {
    return undefined;
  }
}

function isAlive({ pid, start }) {
  if (start) return startOf(pid) === start;
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}

/** @returns the holder as written, or undefined if there is no lock or it cannot be read. */
function read(file) {
  try {
    const holder = JSON.parse(readFileSync(file, 'utf8'));
    return Number.isInteger(holder?.pid) ? holder : undefined;
  } catch {
    return undefined;
  }
}

/** Appears whole or not at all, as a link: a reader must never see a lock half written. */
function create(file) {
  const draft = `${file}.${process.pid}`;
  try {
    writeFileSync(draft, JSON.stringify({ pid: process.pid, start: startOf(process.pid) }), { mode: 0o600 });
    linkSync(draft, file);
    return true;
  } catch (error) {
    if (error.code === 'EEXIST') return false;
    throw error;
  } finally {
    rmSync(draft, { force: true });
  }
}

function age(file) {
  try {
    return Date.now() - statSync(file).mtimeMs;
  } catch {
    return 0;
  }
}

/** @returns the process that holds the lock and lives. */
export function lockHolder(file) {
  const holder = read(file);
  return holder && isAlive(holder) ? { pid: holder.pid } : undefined;
}

/** Removes a dead process's lock; only one process at a time may judge. */
function clearDead(file) {
  const judge = `${file}.takeover`;
  if (!create(judge)) {
    if (!lockHolder(judge) && age(judge) > TAKEOVER_MS) rmSync(judge, { force: true });
    return;
  }
  try {
    const unreadable = !read(file) && age(file) > TAKEOVER_MS;
    if (unreadable || (read(file) && !lockHolder(file))) rmSync(file, { force: true });
  } finally {
    rmSync(judge, { force: true });
  }
}

/** Takes the lock if it is free. @returns what releases it, or undefined if somebody living holds it. */
export function tryLock(file) {
  if (!create(file)) {
    clearDead(file);
    if (!create(file)) return undefined;
  }
  return () => {
    if (read(file)?.pid === process.pid) rmSync(file, { force: true });
  };
}

/**
 * Waits for the lock, does the work and releases.
 * @param {string} file the lock
 * @param {(pid: number) => void} onWait called once, if somebody else holds it
 * @param {() => unknown} work what must not happen twice at once
 */
export async function withLock(file, onWait, work) {
  const pollMs = 200;
  let release = tryLock(file);
  for (let told = false; !release; release = tryLock(file)) {
    const holder = lockHolder(file);
    if (holder && !told) onWait(holder.pid);
    told ||= holder !== undefined;
    await new Promise((done) => setTimeout(done, pollMs));
  }
  try {
    return await work();
  } finally {
    release();
  }
}
