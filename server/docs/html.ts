import { escapeHtml } from '#server/http/escape-html';

/** Text made safe, or put together from safe parts: what `html` makes and takes as it is. */
export class Html {
  constructor(readonly text: string) {}
}

type Part = string | number | Html | readonly Html[];

function safe(part: Part): string {
  if (part instanceof Html) return part.text;
  if (typeof part === 'object') return part.map(({ text }) => text).join('\n');
  return escapeHtml(String(part));
}

/** Puts HTML together; every text that is filled in is escaped. */
export function html(strings: TemplateStringsArray, ...parts: readonly Part[]): Html {
  return new Html(strings.map((text, i) => text + safe(parts[i] ?? '')).join(''));
}
