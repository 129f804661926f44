import { midiOfName } from '#shared/pitch/names';
import { equalTempered, midiOfFrequency } from '#shared/pitch/tuning';
import { openStringsOf } from '#shared/strings/ranges';
import type { BassKind } from '#shared/strings/sections';
import type { Voice } from '#shared/study/study.document';
import type { Hertz } from '#shared/units';

/** Natural harmonics are written up to the eighth partial of a string. */
const HIGHEST_NATURAL_PARTIAL = 8;
const FIRST_NATURAL_PARTIAL = 2;
/** The seventh partial lies 31 cents under the key that names it. */
const SAME_KEY_SEMITONES = 0.5;

/**
 * The frequency at which a natural harmonic sounds: a partial of an open string, with that partial's own
 * tuning. An artificial harmonic (touched a fourth above the stopped note) sounds two octaves above that note,
 * in the note's own tuning, so it needs none.
 * @returns hertz; null where the voice is no natural harmonic or none of the strings has the pitch
 * @source partials of a string: whole multiples of its fundamental
 * @example harmonicFrequency(C#6 on the cello's A string, 'four-string', 440) // 1100, five times 220
 */
export function harmonicFrequency(
  voice: Pick<Voice, 'section' | 'pitch' | 'technique' | 'string'>,
  bassKind: BassKind,
  a4Hz: Hertz,
): Hertz | null {
  if (voice.technique.harmonic !== 'natural') return null;
  const midi = midiOfName(voice.pitch);
  const strings = openStringsOf(voice.section, bassKind);
  const chosen = voice.string === null ? strings : strings.slice(voice.string - 1, voice.string);
  for (let n = FIRST_NATURAL_PARTIAL; n <= HIGHEST_NATURAL_PARTIAL; n += 1) {
    for (const open of chosen) {
      const frequency = n * equalTempered(open, a4Hz);
      if (Math.abs(midiOfFrequency(frequency, a4Hz) - midi) < SAME_KEY_SEMITONES) return frequency;
    }
  }
  return null;
}
