import { escapeHtml } from '#server/http/escape-html';
import type { Letter } from '#server/mail/letters';

/** Titles and names are people's text: line breaks and direction marks would reach headers or disguise what follows. */
function oneLine(text: string): string {
  return text.replace(/[\p{Cc}\u2028\u2029\u202a-\u202e\u2066-\u2069]+/gu, ' ').trim();
}

const MAX_SUBJECT = 200;

export function renderSubject(letter: Letter): string {
  return [...oneLine(letter.subject)].slice(0, MAX_SUBJECT).join('');
}

export function renderText({ paragraphs, link, reason }: Letter): string {
  const body = link === undefined ? [...paragraphs] : [...paragraphs, `${link.label}:\n${link.url}`];
  return [
    ...body.map((paragraph) => paragraph.replace(/[^\P{Cc}\n]/gu, ' ')),
    `-- \n${oneLine(reason)}`,
  ].join('\n\n');
}

export function renderHtml({ paragraphs, link, reason }: Letter): string {
  const body = paragraphs.map((paragraph) => `<p>${escapeHtml(oneLine(paragraph))}</p>`);
  if (link !== undefined) {
    body.push(`<p><a href="${escapeHtml(link.url)}">${escapeHtml(link.label)}</a></p>`);
  }
  const small = `<p style="color:#666;font-size:smaller">${escapeHtml(oneLine(reason))}</p>`;
  return `<!doctype html><html lang="en"><meta charset="utf-8"><body>${body.join('')}${small}</body></html>`;
}
