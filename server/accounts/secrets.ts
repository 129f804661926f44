import { createHash, randomBytes } from 'node:crypto';

/** 128 bits: OWASP ASVS 5.0.0, 11.5.1. */
const SECRET_BYTES = 16;

/** An id or the secret of a link: 22 characters, not to be guessed. */
export function randomSecret(): string {
  return randomBytes(SECRET_BYTES).toString('base64url');
}

/** What is kept of a secret. */
export function digestOf(secret: string): Buffer {
  return createHash('sha256').update(secret).digest();
}
