const SPECIAL = /[!%_]/g;

/** With it goes `escape '!'`: what people look for is text, whatever signs are in it. */
export function containing(text: string): string {
  return `%${text.replace(SPECIAL, (sign) => `!${sign}`)}%`;
}
