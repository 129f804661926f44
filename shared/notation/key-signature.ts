import { fifthsOf } from '#shared/pitch/intervals';
import { parsePitch, type Letter } from '#shared/pitch/names';
import type { SpellingKey } from '#shared/pitch/spelling';
import type { Mode } from '#shared/study/study.document';

/** Fifths by which a mode's signature lies from that of the major key on the same tonic. */
const MODE_FIFTHS: Readonly<Record<Mode, number>> = {
  lydian: 1,
  major: 0,
  mixolydian: -1,
  dorian: -2,
  minor: -3,
  aeolian: -3,
  phrygian: -4,
  locrian: -5,
};

/** The letters in the order in which sharps are set; flats go the other way. */
const SHARP_ORDER: readonly Letter[] = ['F', 'C', 'G', 'D', 'A', 'E', 'B'];
const MOST_SIGNS = SHARP_ORDER.length;

/**
 * The signature of a key: how many sharps, or flats where it is negative.
 * @param key tonic and mode
 * @returns −7 to 7; 0 where the key would need a double accidental in its signature, which is not written: its
 *   notes then all carry their own
 * @throws RangeError where the tonic is not a note
 * @source modes on the line of fifths: common practice
 * @example signatureOf({ tonic: 'Bb', mode: 'dorian' }) // −4
 */
export function signatureOf({ tonic, mode }: SpellingKey): number {
  const pitch = parsePitch(`${tonic}4`);
  if (!pitch) throw new RangeError(`not a tonic: ${tonic}`);
  const fifths = fifthsOf(pitch) + MODE_FIFTHS[mode];
  return Math.abs(fifths) > MOST_SIGNS ? 0 : fifths;
}

/**
 * @param signature sharps, or flats where negative, −7 to 7
 * @returns by how many semitones the signature alters each letter that it alters
 * @example signatureAlterations(-2) // B and E, each by −1
 */
export function signatureAlterations(signature: number): ReadonlyMap<Letter, number> {
  const altered =
    signature >= 0 ? SHARP_ORDER.slice(0, signature) : [...SHARP_ORDER].reverse().slice(0, -signature);
  return new Map(altered.map((letter) => [letter, Math.sign(signature)]));
}
