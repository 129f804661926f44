import type { ChordTone, HarmonyFault } from '#shared/study/harmony/harmony';
import type { Semitones } from '#shared/units';

export type ReadQuality = { readonly tones: readonly ChordTone[] } | { readonly fault: HarmonyFault };

/** Natural degrees above the root, as chord symbols count them: the seventh is the minor one. */
const NATURAL: Readonly<Record<number, Semitones>> = {
  1: 0,
  2: 2,
  3: 4,
  4: 5,
  5: 7,
  6: 9,
  7: 10,
  9: 14,
  11: 17,
  13: 21,
};
const THIRD = 3;
const FIFTH = 5;
const SEVENTH = 7;
const NINTH = 9;
const ELEVENTH = 11;
const MINOR_THIRD: Semitones = 3;
const DIMINISHED_FIFTH: Semitones = 6;
const AUGMENTED_FIFTH: Semitones = 8;
const DIMINISHED_SEVENTH: Semitones = 9;
const MAJOR_SEVENTH: Semitones = 11;

/** A chord while its symbol is read. */
interface Reading {
  tones: ChordTone[];
  /** What a 7, 9, 11 or 13 adds as its seventh. */
  seventh: Semitones;
}

function put(reading: Reading, degree: number, semitones: Semitones = NATURAL[degree] ?? 0): void {
  reading.tones = [...reading.tones.filter((tone) => tone.degree !== degree), { degree, semitones }];
}

function drop(reading: Reading, degree: number): void {
  reading.tones = reading.tones.filter((tone) => tone.degree !== degree);
}

/** The thirds above the fifth up to the figure; common practice: an 11 has no third, a 13 no eleventh. */
function extend(reading: Reading, figure: number): void {
  put(reading, SEVENTH, reading.seventh);
  if (figure >= NINTH) put(reading, NINTH);
  if (figure > NINTH) put(reading, figure);
  const hasMajorThird = reading.tones.some(
    (tone) => tone.degree === THIRD && tone.semitones === NATURAL[THIRD],
  );
  if (figure === ELEVENTH && hasMajorThird) drop(reading, THIRD);
}

/** An altered ninth may stand beside another: 7b9#9. */
function alter(reading: Reading, sign: string, degree: number): void {
  const by = /[b♭-]/u.test(sign) ? -1 : 1;
  const natural = NATURAL[degree] ?? 0;
  const altered = { degree, semitones: natural + by };
  const others = reading.tones.filter((tone) => tone.degree !== degree || tone.semitones !== natural);
  reading.tones = [...others.filter(({ semitones }) => semitones !== altered.semitones), altered];
}

function suspend(reading: Reading, degree: number): void {
  drop(reading, THIRD);
  put(reading, degree);
}

type Part = readonly [RegExp, (reading: Reading, match: RegExpExecArray) => void];

const major = (reading: Reading): void => {
  reading.seventh = MAJOR_SEVENTH;
};
const minor = (reading: Reading): void => put(reading, THIRD, MINOR_THIRD);

/** What kind of triad it is; the first that fits. */
const KINDS: readonly Part[] = [
  [/(?:maj|Maj|MAJ|M|Δ|△)/uy, major],
  [
    /(?:ø|half-?dim)7?/uy,
    (reading) => {
      minor(reading);
      put(reading, FIFTH, DIMINISHED_FIFTH);
      put(reading, SEVENTH);
    },
  ],
  [
    /(?:dim|°|o)/uy,
    (reading) => {
      minor(reading);
      put(reading, FIFTH, DIMINISHED_FIFTH);
      reading.seventh = DIMINISHED_SEVENTH;
    },
  ],
  [/(?:aug|\+)/uy, (reading) => put(reading, FIFTH, AUGMENTED_FIFTH)],
  [/(?:min|mi|m|-|−)/uy, minor],
];

/** A Δ alone means the major seventh, as `maj7` does. */
const DELTA = /[Δ△](?!\d)/uy;

const FIGURES: readonly Part[] = [
  [
    /\(?(?:maj|Maj|M|Δ|△)(7|9|11|13)\)?/uy,
    (reading, [, figure]) => {
      major(reading);
      extend(reading, Number(figure));
    },
  ],
  [/6\/?9/uy, (reading) => [6, NINTH].forEach((degree) => put(reading, degree))],
  [/(?:7|9|11|13)/uy, (reading, [figure]) => extend(reading, Number(figure))],
  [/6/uy, (reading) => put(reading, 6)],
  [/5/uy, (reading) => drop(reading, THIRD)],
];

const CHANGES: readonly Part[] = [
  [/sus([24])/uy, (reading, [, degree]) => suspend(reading, Number(degree))],
  [/sus/uy, (reading) => suspend(reading, 4)],
  [
    /add([b♭#♯])?(2|4|6|9|11|13)/uy,
    (reading, [, sign, degree]) => {
      put(reading, Number(degree));
      if (sign) alter(reading, sign, Number(degree));
    },
  ],
  [/(?:maj|Maj|M)7/uy, (reading) => put(reading, SEVENTH, MAJOR_SEVENTH)],
  [/([b♭#♯+-])(5|9|11|13)/uy, (reading, [, sign = '', degree]) => alter(reading, sign, Number(degree))],
  [/(?:no|omit)(3|5)/uy, (reading, [, degree]) => drop(reading, Number(degree))],
  [/[(),\s]/uy, () => undefined],
];

function take(parts: readonly Part[], reading: Reading, text: string, at: number): number {
  for (const [regex, act] of parts) {
    regex.lastIndex = at;
    const match = regex.exec(text);
    if (!match) continue;
    act(reading, match);
    return at + match[0].length;
  }
  return at;
}

/**
 * Reads what stands after the root of a chord symbol: `m7`, `maj9`, `dim7`, `sus4`, `6/9`, `7b9#11`.
 * @param text without root and bass
 * @returns the tones above the root, rising; or the place from which it cannot be read
 * @source common practice of chord symbols
 * @example readQuality('m7') // { tones: [1: 0, 3: 3, 5: 7, 7: 10] }
 */
export function readQuality(text: string): ReadQuality {
  const reading: Reading = { tones: [], seventh: NATURAL[SEVENTH] ?? 0 };
  [1, THIRD, FIFTH].forEach((degree) => put(reading, degree));
  DELTA.lastIndex = 0;
  if (DELTA.test(text)) put(reading, SEVENTH, MAJOR_SEVENTH);
  let at = take(FIGURES, reading, text, take(KINDS, reading, text, 0));
  for (let before = -1; at > before && at < text.length;) {
    before = at;
    at = take(CHANGES, reading, text, at);
  }
  if (at < text.length) {
    const message = `“${text.slice(at)}” cannot be read here; a chord goes on with m, dim, aug, 6, 7, maj7, 9, 11, 13, sus4, add9, b5, #11 or a bass such as /B.`;
    return { fault: { start: at, end: text.length, message } };
  }
  return { tones: reading.tones.sort((a, b) => a.semitones - b.semitones) };
}
