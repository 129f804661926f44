import type { Midi, Semitones } from '#shared/units';
import type { SectionPair } from '#shared/voicing/section-pairs';
import { pairIndex } from '#shared/voicing/section-pairs';

/** The index of two sections for each lower pitch and each interval above it. */
export interface SiltlineMap {
  readonly lowest: Midi;
  readonly highest: Midi;
  readonly widest: Semitones;
  /** By lower pitch from the lowest, then by interval from the semitone: `index[0][0]` is the lowest's semitone. */
  readonly index: readonly (readonly number[])[];
}

/** What part of the field is drawn. */
export interface SiltlineExtent {
  readonly lowest: Midi;
  readonly highest: Midi;
  readonly widest: Semitones;
}

/**
 * The field on which the siltline, the line of index 50, is drawn.
 * @param pair the two sections in use
 * @param extent lower pitches, inclusive, and the widest interval
 * @returns an index for each whole semitone of both
 */
export function siltlineMap(pair: SectionPair, extent: SiltlineExtent): SiltlineMap {
  const { lowest, highest, widest } = extent;
  const index = Array.from({ length: Math.max(highest - lowest + 1, 0) }, (_, i) =>
    Array.from({ length: widest }, (_unused, interval) => pairIndex(pair, lowest + i, interval + 1)),
  );
  return { lowest, highest, widest, index };
}
