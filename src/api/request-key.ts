const BYTES = 16;
const HEX = 16;
/** RFC 9562, section 5.4: the version's and the variant's bits of a random UUID. */
const VERSION = { at: 6, keep: 0x0f, set: 0x40 } as const;
const VARIANT = { at: 8, keep: 0x3f, set: 0x80 } as const;
const GROUPS = /^(.{8})(.{4})(.{4})(.{4})(.{12})$/;

/**
 * Names one intended change: sent twice under the same key, it is done once. A random UUID, made here because
 * browsers give theirs only to pages over https.
 */
export function newRequestKey(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(BYTES));
  for (const { at, keep, set } of [VERSION, VARIANT]) bytes[at] = ((bytes[at] ?? 0) & keep) | set;
  const hex = Array.from(bytes, (byte) => byte.toString(HEX).padStart(2, '0')).join('');
  return hex.replace(GROUPS, '$1-$2-$3-$4-$5');
}
