/** A piece of a mail's text; with an address it is a link into this site. */
export interface MailPart {
  readonly text: string;
  readonly path: string | null;
}

const ADDRESS = /(https?:\/\/[^\s<>"]+)/;

/**
 * Finds the links in a mail. Only addresses of this very site become links: the mail is text that somebody
 * wrote, and shows as it is.
 * @param text of the mail
 * @param origin of this site
 * @example mailParts('see http://a.test/x now', 'http://a.test').map(({ path }) => path) // [null, '/x', null]
 */
export function mailParts(text: string, origin: string): readonly MailPart[] {
  return text
    .split(ADDRESS)
    .filter((piece) => piece !== '')
    .map((piece) => ({ text: piece, path: ADDRESS.test(piece) ? pathHere(piece, origin) : null }));
}

function pathHere(address: string, origin: string): string | null {
  if (!URL.canParse(address)) return null;
  const url = new URL(address);
  const path = url.pathname + url.search + url.hash;
  return url.origin === origin && !path.startsWith('//') ? path : null;
}
