import { comfortableReach } from '#shared/study/reach';
import { emptyChord } from '#shared/study/new-study';
import type { Chord } from '#shared/study/study.document';
import { applyTyped } from '#shared/study/typed.changes';
import { parseTypingLine } from '#shared/study/typing-line';

/** A chord as one would type it; its voices are called `note-1`, `note-2` … in the order of the line. */
export function chordOf(line: string): Chord {
  const { voices, faults } = parseTypingLine(line, 'english', comfortableReach('four-string'));
  if (faults.length > 0) throw new Error(faults.map(({ message }) => message).join(' '));
  let count = 0;
  return applyTyped(emptyChord('chord-1'), voices, () => `note-${(count += 1)}`);
}
