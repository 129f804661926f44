import type { NoteNaming } from '#shared/pitch/display';
import { readNote, type ReadNote } from '#shared/pitch/reading';
import { readQuality } from '#shared/study/harmony/chord-quality';
import type { ReadHarmony } from '#shared/study/harmony/harmony';

/** Of the longest names of notes: `sol##`, `eses`. */
const LONGEST_ROOT = 5;

interface Rooted {
  readonly root: ReadNote;
  /** Where the root's name ends. */
  readonly end: number;
  readonly quality: ReturnType<typeof readQuality>;
}

/** Where the quality stops making sense; the end where it makes sense throughout. */
function readableTo({ quality, end }: Rooted, length: number): number {
  return 'fault' in quality ? end + quality.fault.start : length + 1;
}

/** Every way to take the beginning for a root: B♭ with m7, or B with ♭m7; the one that reads furthest stands. */
function rootedOf(text: string, naming: NoteNaming): Rooted | null {
  const ways = Array.from({ length: Math.min(LONGEST_ROOT, text.length) }, (_, index) => index + 1)
    .reverse()
    .flatMap((end) => {
      const root = readNote(text.slice(0, end), naming);
      return root ? [{ root, end, quality: readQuality(text.slice(end)) }] : [];
    });
  const [first] = ways;
  if (!first) return null;
  return ways.reduce((a, b) => (readableTo(b, text.length) > readableTo(a, text.length) ? b : a), first);
}

/** The bass after the last slash; in 6/9 none stands there. */
function slashOf(text: string): number {
  const slash = text.lastIndexOf('/');
  return slash > 0 && !/^9\D*$/u.test(text.slice(slash + 1)) ? slash : -1;
}

/**
 * Reads a chord symbol: a root as the reader names notes, its quality, and a bass after a slash.
 * @param text one word
 * @param naming how the reader names notes
 * @returns the chord, or the fault with its place in the word; `null` where no note begins the word
 * @example readChordSymbol('Bbm7/Db', 'english') // root B♭, tones 0 3 7 10, bass D♭
 */
export function readChordSymbol(text: string, naming: NoteNaming): ReadHarmony | null {
  const slash = slashOf(text);
  const chord = slash < 0 ? text : text.slice(0, slash);
  const rooted = rootedOf(chord, naming);
  if (!rooted) return null;
  const { root, end, quality } = rooted;
  if ('fault' in quality) {
    const { start, end: to, message } = quality.fault;
    return { fault: { start: end + start, end: end + to, message } };
  }
  const below = slash < 0 ? '' : text.slice(slash + 1);
  const bass = slash < 0 ? root : readNote(below, naming);
  if (bass) return { harmony: { root, tones: quality.tones, bass } };
  const message =
    below === ''
      ? 'The bass is missing after the slash, such as G/B.'
      : `“${below}” is not a note to stand in the bass.`;
  return { fault: { start: below === '' ? slash : slash + 1, end: text.length, message } };
}
