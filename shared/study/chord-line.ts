import type { NoteNaming } from '#shared/pitch/display';
import type { SpellingKey } from '#shared/pitch/spelling';
import type { Reach } from '#shared/study/dealing';
import { readChordSymbol } from '#shared/study/harmony/chord-symbol';
import type { DealChoice, DealWay } from '#shared/study/harmony/deal-choice';
import { dealHarmony, type KeptVoice } from '#shared/study/harmony/deal-harmony';
import type { ChordTone, Harmony, ReadHarmony } from '#shared/study/harmony/harmony';
import { readNumeral } from '#shared/study/harmony/numeral';
import { readSection } from '#shared/study/section-names';
import { parseTypingLine, type TypedLine } from '#shared/study/typing-line';
import { readPitch } from '#shared/study/typing-line.words';

/** All that the reading of a line depends on, besides its text. */
export interface LineContext {
  readonly naming: NoteNaming;
  /** Where each section plays comfortably. */
  readonly reach: Reach;
  /** The study's key, in which numerals are read. */
  readonly key: SpellingKey;
  readonly deal: DealChoice;
  /** Locked notes, round which a chord is dealt. */
  readonly kept: readonly KeptVoice[];
}

/** A symbol or numeral as it was dealt. */
export interface DealtLine {
  readonly symbol: string;
  readonly harmony: Harmony;
  readonly way: DealWay;
  readonly left: readonly ChordTone[];
  /** The word could be a single note too. */
  readonly alsoNote: boolean;
}

export interface ReadLine extends TypedLine {
  /** `null` for a line of notes. */
  readonly dealt: DealtLine | null;
}

/** One word, and perhaps how it is to be dealt. */
const SYMBOL_LINE =
  /^\s*(?<symbol>[^\s,;:|[\]]+)(?:\s+(?<way>open|closed?|series|overtones?)(?:\s+position)?)?\s*$/iu;
/** A word with one of these figures is taken for a chord, for C6 and C7 are rare as notes and common as chords. */
const CHORD_FIGURES = /[67]$/u;
/** Two sections are written like flats: DB and Cb. */
const FLAT = /^[A-Ga-g]b$/u;
/** Notes joined in the word are a double stop. */
const JOINED = /\d\+\S/u;

function wayOf(word: string | undefined): DealWay | null {
  if (word === undefined) return null;
  const lower = word.toLowerCase();
  if (lower === 'open') return 'open';
  return lower.startsWith('close') ? 'close' : 'series';
}

/**
 * The rule: one word alone is a numeral or a chord symbol, unless it is a note with its octave. `C4` is a note,
 * `C6` and `C7` are chords (as notes they are written with their section: `Vn1 C7`), `VI` is a numeral.
 */
function readAlone(word: string, { naming, key }: LineContext): ReadHarmony | null {
  if (JOINED.test(word)) return null;
  const numeral = readNumeral(word, key);
  if (numeral && 'harmony' in numeral) return numeral;
  // DB are the double basses, Db is D flat.
  const isSection = readSection(word, 0)?.end === word.length;
  if (isSection && !FLAT.test(word)) return null;
  const isNote = 'pitch' in readPitch(word, naming);
  if (isNote && !CHORD_FIGURES.test(word)) return null;
  const symbol = readChordSymbol(word, naming);
  if (symbol && 'harmony' in symbol) return symbol;
  // A figure at its end makes it an attempt at a note: its octave is told, or that it is none.
  return isNote || /^\D+-?\d+$/u.test(word) ? null : (symbol ?? numeral);
}

/**
 * Reads the line of the bench: notes, a chord symbol (`Bbm7`, `G/B`) or a Roman numeral in the study's key
 * (`V6/5`), which is dealt to the sections, or, after it, how to deal this one: `Dm7 close`.
 * @param text as typed
 * @param context naming, ranges, key, how to deal, and what stays
 * @returns the voices; or every fault with its place, and no voices
 * @example readLine('Dm7', context).voices.length // 5
 */
export function readLine(text: string, context: LineContext): ReadLine {
  const groups = SYMBOL_LINE.exec(text)?.groups;
  const symbol = groups?.symbol ?? '';
  const read = symbol === '' ? null : readAlone(symbol, context);
  if (!read) return { ...parseTypingLine(text, context.naming, context.reach), dealt: null };
  const from = text.indexOf(symbol);
  if ('fault' in read) {
    const { start, end, message } = read.fault;
    return { voices: [], faults: [{ start: from + start, end: from + end, message }], dealt: null };
  }
  const { harmony } = read;
  const way = wayOf(groups?.way) ?? context.deal.way;
  const { voices, left } = dealHarmony(harmony, { ...context.deal, way }, context.reach, context.kept);
  const alsoNote = 'pitch' in readPitch(symbol, context.naming);
  return { voices, faults: [], dealt: { symbol, harmony, way, left, alsoNote } };
}
