import type { ReadNote } from '#shared/pitch/reading';
import { parsePitch } from '#shared/pitch/names';
import type { SpellingKey } from '#shared/pitch/spelling';
import { readQuality } from '#shared/study/harmony/chord-quality';
import { toneName, type ChordTone, type ReadHarmony } from '#shared/study/harmony/harmony';
import { seventhAbove, MAJOR_SCALE, scaleOf } from '#shared/study/harmony/scales';
import type { Semitones } from '#shared/units';

const ROMAN = ['I', 'II', 'III', 'IV', 'V', 'VI', 'VII'] as const;
const LEADING_DEGREE = 6;
const MAJOR_SEVENTH_UP: Semitones = 11;
const SEVENTH = 7;

/** Accidental, numeral, the sign of its triad, and what follows. */
const NUMERAL =
  /^(?<sign>[b♭#♯]?)(?<roman>VII|VI|IV|V|III|II|I|vii|vi|iv|v|iii|ii|i)(?<kind>°|o|ø|\+)?(?<rest>.*)$/u;
/** Figured bass after a numeral, with or without its stroke, and the tone that it puts lowest. */
const FIGURES: readonly (readonly [RegExp, { readonly seventh: boolean; readonly lowest: number }])[] = [
  [/^6\/?5$/u, { seventh: true, lowest: 3 }],
  [/^4\/?3$/u, { seventh: true, lowest: 5 }],
  [/^(?:4\/?)?2$/u, { seventh: true, lowest: SEVENTH }],
  [/^6\/?4$/u, { seventh: false, lowest: 5 }],
  [/^6(?:\/?3)?$/u, { seventh: false, lowest: 3 }],
  [/^7$/u, { seventh: true, lowest: 1 }],
  [/^(?:5(?:\/?3)?)?$/u, { seventh: false, lowest: 1 }],
];
/** `V7/V`: the numeral after the last stroke names the key in which the first is read. */
const APPLIED = /^(?<own>.+)\/(?<key>[b♭#♯]?(?:VII|VI|IV|V|III|II|I|vii|vi|iv|v|iii|ii|i))$/u;

/** The chord on a degree: its root, and the seventh that the key has above it. */
interface Degree {
  readonly root: ReadNote;
  readonly seventh: Semitones;
}

function tonicOf(key: SpellingKey): ReadNote {
  const pitch = parsePitch(`${key.tonic}4`);
  if (!pitch) throw new RangeError(`not a tonic: ${key.tonic}`);
  return pitch;
}

/**
 * The root of a numeral. Without an accidental it is a degree of the mode, but a diminished VII stands on the
 * leading note; with one it is counted from the major scale.
 */
function degreeOf(key: SpellingKey, place: number, sign: string, kind: string): Degree {
  const scale = scaleOf(key.mode);
  const leading = place === LEADING_DEGREE && kind !== '' && kind !== '+';
  const alteration = sign === '' ? 0 : /[b♭]/u.test(sign) ? -1 : 1;
  const natural = MAJOR_SCALE[place] ?? 0;
  const own = sign === '' ? (scale[place] ?? 0) : natural + alteration;
  const semitones = leading && sign === '' ? MAJOR_SEVENTH_UP : own;
  const root = toneName(tonicOf(key), { degree: place + 1, semitones });
  return { root, seventh: seventhAbove(scale, semitones, place) };
}

function triad(isMajor: boolean, kind: string): string {
  if (kind === '+') return 'aug';
  if (kind !== '') return 'dim';
  return isMajor ? '' : 'm';
}

/** V and applied dominants have the minor seventh in every mode; the others that of the key. */
function withSeventh(tones: readonly ChordTone[], semitones: Semitones): readonly ChordTone[] {
  return [...tones, { degree: SEVENTH, semitones }];
}

const MINOR_SEVENTH: Semitones = 10;
const DIMINISHED_SEVENTH: Semitones = 9;

function seventhOf(kind: string, isDominant: boolean, ofKey: Semitones): Semitones {
  if (kind === 'ø' || isDominant) return MINOR_SEVENTH;
  if (kind === 'o' || kind === '°') return DIMINISHED_SEVENTH;
  return ofKey;
}

interface Parts {
  readonly sign: string;
  readonly roman: string;
  readonly kind: string;
  readonly rest: string;
}

function partsOf(text: string): Parts | null {
  const groups = NUMERAL.exec(text)?.groups;
  if (!groups) return null;
  const { sign = '', roman = '', kind = '', rest = '' } = groups;
  return { sign, roman, kind, rest };
}

function chordOn({ sign, roman, kind, rest }: Parts, key: SpellingKey): ReadHarmony {
  const isMajor = roman === roman.toUpperCase();
  const place = ROMAN.findIndex((known) => known === roman.toUpperCase());
  const { root, seventh } = degreeOf(key, place, sign, kind);
  const figure = FIGURES.find(([regex]) => regex.test(rest))?.[1];
  const quality = readQuality(triad(isMajor, kind) + (figure ? '' : rest));
  const before = sign.length + roman.length + kind.length;
  if ('fault' in quality) {
    const message = `“${rest}” cannot be read after the numeral; it goes on with 6, 6/4, 7, 6/5, 4/3, 4/2, 9, maj7, sus4 or another numeral after a stroke, such as V7/V.`;
    return { fault: { start: before, end: before + rest.length, message } };
  }
  const isDominant = isMajor && kind === '' && (roman === 'V' || sign !== '');
  const own = seventhOf(kind, isDominant, seventh);
  const needs = (figure?.seventh ?? kind === 'ø') && !quality.tones.some(({ degree }) => degree === SEVENTH);
  const tones = needs ? withSeventh(quality.tones, own) : quality.tones;
  const lowest = tones.find(({ degree }) => degree === (figure?.lowest ?? 1));
  return { harmony: { root, tones, bass: lowest ? toneName(root, lowest) : root } };
}

/** The key in which an applied chord is read: major or minor as its numeral is written. */
function appliedKey(numeral: string, key: SpellingKey): SpellingKey | null {
  const parts = partsOf(numeral);
  const read = parts && chordOn({ ...parts, kind: '', rest: '' }, key);
  if (!parts || !read || !('harmony' in read)) return null;
  const { letter, alteration } = read.harmony.root;
  const tonic = letter + (alteration < 0 ? 'b'.repeat(-alteration) : '#'.repeat(alteration));
  return { tonic, mode: parts.roman === parts.roman.toUpperCase() ? 'major' : 'minor' };
}

/**
 * Reads a Roman numeral in the study's key: `ii7`, `V6/5`, `bVI`, `viio7`, `V7/V`.
 * Upper case is major, lower case minor, o diminished, ø half diminished, + augmented. A seventh is the key's,
 * but that of V and of chromatic major chords is minor. Figures say what stands lowest.
 * @param text one word
 * @param key the study's
 * @returns the chord, or the fault with its place; `null` where the word is no numeral
 * @source common practice
 * @example readNumeral('V7/V', { tonic: 'C', mode: 'major' }) // root D, tones 0 4 7 10
 */
export function readNumeral(text: string, key: SpellingKey): ReadHarmony | null {
  const applied = APPLIED.exec(text)?.groups;
  const within = applied?.key === undefined ? key : appliedKey(applied.key, key);
  const parts = partsOf(applied?.own ?? text);
  if (!parts || !within) return null;
  return chordOn(parts, within);
}
