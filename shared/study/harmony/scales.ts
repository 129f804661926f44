import type { Mode } from '#shared/study/study.document';
import type { Semitones } from '#shared/units';

const SEMITONES_PER_OCTAVE: Semitones = 12;
/** Degrees up to the seventh above one: six. */
const TO_THE_SEVENTH = 6;

export const MAJOR_SCALE: readonly Semitones[] = [0, 2, 4, 5, 7, 9, 11];

/** The degree of the major scale on which each mode begins; minor is the natural one. */
const FIRST_DEGREE: Readonly<Record<Mode, number>> = {
  major: 0,
  dorian: 1,
  phrygian: 2,
  lydian: 3,
  mixolydian: 4,
  minor: 5,
  aeolian: 5,
  locrian: 6,
};

/**
 * @returns the seven degrees of a mode in semitones above its tonic
 * @source the church modes as turns of the major scale
 * @example scaleOf('dorian') // [0, 2, 3, 5, 7, 9, 10]
 */
export function scaleOf(mode: Mode): readonly Semitones[] {
  const first = FIRST_DEGREE[mode];
  const turned = [
    ...MAJOR_SCALE.slice(first),
    ...MAJOR_SCALE.slice(0, first).map((s) => s + SEMITONES_PER_OCTAVE),
  ];
  const tonic = turned[0] ?? 0;
  return turned.map((semitones) => semitones - tonic);
}

/**
 * The seventh above a root in a key.
 * @param scale of the key
 * @param root semitones above the tonic
 * @param place the root's degree, counted from 0
 * @returns semitones above the root
 */
export function seventhAbove(scale: readonly Semitones[], root: Semitones, place: number): Semitones {
  const at = place + TO_THE_SEVENTH;
  const degree = scale[at % scale.length] ?? 0;
  return degree + SEMITONES_PER_OCTAVE * Math.floor(at / scale.length) - root;
}
