import type { NoteNaming } from '#shared/pitch/display';
import { readHow } from '#shared/study/typing-line.how';
import type { SaidHow, TypingFault } from '#shared/study/typing-line.words';

/** What a bracket says, and where it ends. */
interface Bracket {
  readonly end: number;
  readonly said: readonly SaidHow[];
  readonly faults: readonly TypingFault[];
}

const GAP = /[\s,;]*/uy;
const UNREAD = /[^\s,;\]]+/uy;
/** Some of what can stand there, for whoever typed something else. */
const EXPECTED = 'players (4, solo), tasto, ponticello, muted, tremolo, pizz, harmonic, pp … ff, III, locked';

function lengthAt(regex: RegExp, text: string, at: number): number {
  regex.lastIndex = at;
  return regex.exec(text)?.[0].length ?? 0;
}

/**
 * Reads a bracket that says how the note before it is played: `[solo sul tasto pp III locked]`.
 * @param text the line
 * @param start where its `[` stands
 * @param naming how the reader names notes
 * @returns what it says, every fault in it, and where it ends: at the end of the line if it is never closed
 * @example bracketAt('A2[pp]', 2, 'english').end // 6
 */
export function bracketAt(text: string, start: number, naming: NoteNaming): Bracket {
  const said: SaidHow[] = [];
  const faults: TypingFault[] = [];
  let at = start + 1 + lengthAt(GAP, text, start + 1);
  while (at < text.length && text.charAt(at) !== ']') {
    const read = readHow(text, at, 'brackets', naming);
    // A second bracket within the first is read as a word of its own, so that the reading goes on.
    const end = read?.end ?? at + Math.max(lengthAt(UNREAD, text, at), 1);
    const place = { start: at, end };
    const word = text.slice(at, end);
    if (!read)
      faults.push({ ...place, message: `“${word}” does not say how to play; expected: ${EXPECTED}.` });
    else if ('fault' in read.setting) faults.push({ ...place, message: read.setting.fault });
    else said.push({ ...place, setting: read.setting });
    at = end + lengthAt(GAP, text, end);
  }
  if (at >= text.length) {
    faults.push({ start, end: start + 1, message: 'This bracket is not closed: ] is missing.' });
  }
  return { end: Math.min(at + 1, text.length), said, faults };
}
