import { LETTER_SEMITONES, midiOf, type Letter, type Pitch } from '#shared/pitch/names';

const LETTER_ORDER: readonly Letter[] = ['C', 'D', 'E', 'F', 'G', 'A', 'B'];
const STEPS = LETTER_ORDER.length;
const SEMITONES = 12;
/** A fifteenth is two octaves; wider intervals are named by what they exceed them by. */
const FIFTEENTH_STEPS = 14;

const NAMES = [
  'unison',
  'second',
  'third',
  'fourth',
  'fifth',
  'sixth',
  'seventh',
  'octave',
  'ninth',
  'tenth',
  'eleventh',
  'twelfth',
  'thirteenth',
  'fourteenth',
  'two octaves',
] as const;
const SHORT = [
  '1',
  '2nd',
  '3rd',
  '4th',
  '5th',
  '6th',
  '7th',
  '8ve',
  '9th',
  '10th',
  '11th',
  '12th',
  '13th',
  '14th',
  '15th',
];
/** Degrees that are perfect, counted from 0 within the octave. */
const PERFECT = new Set([0, 3, 4]);

const PERFECT_QUALITIES = new Map([
  [-2, 'doubly diminished'],
  [-1, 'diminished'],
  [0, ''],
  [1, 'augmented'],
  [2, 'doubly augmented'],
]);
const OTHER_QUALITIES = new Map([
  [-3, 'doubly diminished'],
  [-2, 'diminished'],
  [-1, 'minor'],
  [0, 'major'],
  [1, 'augmented'],
  [2, 'doubly augmented'],
]);
const SHORT_QUALITIES: Readonly<Record<string, string>> = {
  '': '',
  minor: 'min ',
  major: 'maj ',
  diminished: 'dim ',
  augmented: 'aug ',
  'doubly diminished': 'ddim ',
  'doubly augmented': 'aaug ',
};

interface Measured {
  readonly quality: string;
  /** Letters above the lower one, 0 to {@link FIFTEENTH_STEPS}. */
  readonly steps: number;
  /** Whole octaves taken off above two octaves. */
  readonly octavesOver: number;
}

function placeOf({ letter, octave }: Pitch): number {
  return LETTER_ORDER.indexOf(letter) + STEPS * octave;
}

/** Of two that sound alike the one on the lower letter is the lower. */
function risingPair(a: Pitch, b: Pitch): readonly [Pitch, Pitch] {
  const rise = midiOf(b) - midiOf(a) || placeOf(b) - placeOf(a);
  return rise >= 0 ? [a, b] : [b, a];
}

function measure(a: Pitch, b: Pitch): Measured | null {
  const [lower, upper] = risingPair(a, b);
  const all = placeOf(upper) - placeOf(lower);
  if (all < 0) return null;
  const degree = all % STEPS;
  const octaves = Math.floor(all / STEPS);
  const natural = LETTER_SEMITONES[LETTER_ORDER[degree] ?? 'C'] + SEMITONES * octaves;
  const off = midiOf(upper) - midiOf(lower) - natural;
  const quality = (PERFECT.has(degree) ? PERFECT_QUALITIES : OTHER_QUALITIES).get(off);
  if (quality === undefined) return null;
  const octavesOver = all <= FIFTEENTH_STEPS ? 0 : Math.ceil((all - FIFTEENTH_STEPS) / STEPS);
  return { quality, steps: all - STEPS * octavesOver, octavesOver };
}

function semitonesBetween(a: Pitch, b: Pitch): number {
  return Math.abs(midiOf(a) - midiOf(b));
}

/**
 * The interval between two spelt pitches, in words.
 * @returns e.g. `minor sixth`, `fifth`, `two octaves`; `n semitones` where the spelling has no common name
 * @example intervalName(A2, F3) // 'minor sixth'
 */
export function intervalName(a: Pitch, b: Pitch): string {
  const measured = measure(a, b);
  if (!measured || measured.octavesOver > 0) return `${semitonesBetween(a, b)} semitones`;
  return `${measured.quality} ${NAMES[measured.steps] ?? ''}`.trim();
}

/**
 * The same, short enough for beside a bracket.
 * @returns e.g. `min 6th`, `5th`, `8ve`
 * @example shortIntervalName(A2, F3) // 'min 6th'
 */
export function shortIntervalName(a: Pitch, b: Pitch): string {
  const measured = measure(a, b);
  if (!measured || measured.octavesOver > 0) return `${semitonesBetween(a, b)} st`;
  if (measured.steps === 0 && measured.quality === '') return 'unison';
  return `${SHORT_QUALITIES[measured.quality] ?? ''}${SHORT[measured.steps] ?? ''}`;
}

/** @returns the name with the article that a sentence needs: `a minor sixth`, `an octave`, `two octaves` */
export function withArticle(interval: string): string {
  if (interval === 'two octaves' || /^\d/.test(interval)) return interval;
  return `${/^[aeo]/.test(interval) ? 'an' : 'a'} ${interval}`;
}
