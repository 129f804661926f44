import type { Letter, Pitch } from '#shared/pitch/names';

/** What is in force for a letter in an octave since the bar line. */
export type InForce = ReadonlyMap<string, number>;

export interface SetAccidentals {
  /** For each note the alteration that must be written before it; null where what is in force says it. */
  readonly written: readonly (number | null)[];
  readonly inForce: InForce;
}

function placeOf({ letter, octave }: Pitch): string {
  return `${letter}${octave}`;
}

/**
 * Which notes of one moment on one staff need an accidental: those that differ from what the signature or an
 * accidental earlier in the bar has put in force in their octave, and both of two that share a line.
 * @param pitches as written
 * @param signature by how much the key signature alters each letter
 * @param inForce what earlier moments of the bar have set
 * @returns the accidentals, in the order of `pitches`, and what is in force afterwards
 * @source an accidental holds for its octave until the bar line: common practice
 * @example setAccidentals([B4], signature of F major, new Map()) // 0: a natural
 */
export function setAccidentals(
  pitches: readonly Pitch[],
  signature: ReadonlyMap<Letter, number>,
  inForce: InForce,
): SetAccidentals {
  const meant = new Map<string, Set<number>>();
  for (const pitch of pitches) {
    const place = placeOf(pitch);
    meant.set(place, (meant.get(place) ?? new Set()).add(pitch.alteration));
  }
  const after = new Map(inForce);
  const written = pitches.map((pitch) => {
    const place = placeOf(pitch);
    const known = inForce.get(place) ?? signature.get(pitch.letter) ?? 0;
    const shared = (meant.get(place)?.size ?? 1) > 1;
    after.set(place, pitch.alteration);
    return shared || known !== pitch.alteration ? pitch.alteration : null;
  });
  return { written, inForce: after };
}
