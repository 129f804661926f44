const BYTES = 12;

/** A short random id for a chord, a voice or a link. */
export function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(BYTES));
  return Array.from(bytes, (byte) => byte.toString(36).padStart(2, '0')).join('');
}
