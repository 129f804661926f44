import { COMMON_PASSWORDS, COMMON_WORDS } from '#server/accounts/common-passwords';

const APP_NAME = 'siltline';
/** A name of three letters is in too many words to be refused for it. */
const SHORTEST_OWN_WORD = 4;
/** `aaaaaaaa`, `abababab`: this few different characters are tried first. */
const FEWEST_DIFFERENT = 4;

interface Person {
  readonly name: string;
  readonly email: string;
}

/** What others know of somebody: the words of the name, and the address before the @. */
function ownWords({ name, email }: Person): string[] {
  return [...name.split(/\s+/u), ...email.split(/[@.+_-]/u)]
    .map((word) => word.toLowerCase())
    .filter((word) => word.length >= SHORTEST_OWN_WORD);
}

/** What is left of `Password1!` and of `2024dragon` when the usual dressing is taken off. */
function withoutDressing(password: string): string {
  return password.replace(/^\P{L}{0,6}|\P{L}{0,6}$/gu, '');
}

/** @returns what speaks against a password, as a sentence; null when nothing does. */
export function passwordFault(password: string, person: Person): string | null {
  const lower = password.toLowerCase();
  const core = withoutDressing(lower);
  if ([lower, core].some((word) => COMMON_PASSWORDS.has(word)) || COMMON_WORDS.has(core)) {
    return 'this password is among the first that are tried: take another';
  }
  if (new Set(lower).size < FEWEST_DIFFERENT) return 'a password needs more different characters';
  if ([APP_NAME, ...ownWords(person)].includes(core) || lower.includes(APP_NAME)) {
    return 'a password must not be your own name, your address or the name of this program';
  }
  return null;
}
