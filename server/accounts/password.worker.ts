import { createHmac } from 'node:crypto';
import { parentPort } from 'node:worker_threads';
import { compareSync, hashSync } from 'bcryptjs';

export type PasswordJob =
  | { readonly kind: 'hash'; readonly password: string; readonly cost: number }
  | { readonly kind: 'compare'; readonly password: string; readonly hash: string };

/** Fixed for good: with another one no password would fit any more. */
const LABEL = 'siltline.password.v1';

/** Bcrypt reads 72 bytes and stops at a NUL: 44 characters of base64 carry every character of a longer password. */
function digestOf(password: string): string {
  return createHmac('sha256', LABEL).update(password, 'utf8').digest('base64');
}

function run(job: PasswordJob): string | boolean {
  const digest = digestOf(job.password);
  return job.kind === 'hash' ? hashSync(digest, job.cost) : compareSync(digest, job.hash);
}

const port = parentPort;
port?.on('message', (job: PasswordJob) => port.postMessage(run(job)));
