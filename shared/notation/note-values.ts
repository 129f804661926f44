/** Lengths are counted in sixty-fourth notes: the shortest beat, a sixteenth, has at least a quarter of it. */
export const WHOLE_TICKS = 64;
const BREVE_TICKS = 128;

/** The notes that one sign can write; the number is the part of a whole note, as in a metre. */
export const NOTE_SIGNS = ['breve', 1, 2, 4, 8, 16, 32, 64] as const;
export type NoteSign = (typeof NOTE_SIGNS)[number];

export interface NoteValue {
  readonly sign: NoteSign;
  readonly dotted: boolean;
  readonly ticks: number;
}

/** A dot makes a note half as long again. */
const DOT = 1.5;

/** All values, the longest first; a sixty-fourth has no dot, since nothing shorter is counted. */
const VALUES: readonly NoteValue[] = NOTE_SIGNS.flatMap((sign) => {
  const ticks = sign === 'breve' ? BREVE_TICKS : WHOLE_TICKS / sign;
  const plain = { sign, dotted: false, ticks };
  return Number.isInteger(ticks * DOT) && sign !== 'breve'
    ? [{ sign, dotted: true, ticks: ticks * DOT }, plain]
    : [plain];
});

/**
 * @param beats of a chord
 * @param unit the metre's lower figure
 * @returns ticks, not rounded
 * @example ticksOf(4, 4) // 64
 */
export function ticksOf(beats: number, unit: number): number {
  return (beats * WHOLE_TICKS) / unit;
}

/**
 * Writes a length that stays within one bar as notes tied to each other: from off a beat first up to the next
 * beat, from a beat as long a note as fits.
 * @param position ticks from the bar line, whole
 * @param length ticks, whole
 * @param beat ticks of a beat
 * @returns the values in their order
 * @source common practice
 * @example valuesOf(0, 80, 16) // a whole note and a quarter
 */
export function valuesOf(position: number, length: number, beat: number): readonly NoteValue[] {
  const values: NoteValue[] = [];
  let at = position;
  const end = position + length;
  while (at < end) {
    const toBeat = (beat - (at % beat)) % beat;
    const room = toBeat > 0 ? Math.min(end - at, toBeat) : end - at;
    const value = VALUES.find(({ ticks }) => ticks <= room);
    if (!value) break;
    values.push(value);
    at += value.ticks;
  }
  return values;
}
