/**
 * The one rule by which two spellings of an address are the same: canonical Unicode composition, no space around it,
 * lower case. Accents stay, so `a@x.example` and `á@x.example` are two people.
 */
export function normaliseEmail(typed: string): string {
  return typed.normalize('NFC').trim().toLowerCase();
}
