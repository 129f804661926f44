import type { PureTone } from '#shared/hearing/partials';
import type { RoughnessModel } from '#shared/hearing/roughness-models';
import { ROUGHNESS } from '#shared/hearing/roughness-models';
import { midiOfFrequency } from '#shared/pitch/tuning';
import type { Hertz } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import { powerOf } from '#shared/voicing/muddiness/joined';

/** The published tables take partials to a millionth of a semitone: nearer ones are one. */
const PLACES_PER_SEMITONE = 1e6;

/**
 * The partials of a chord as the published measures take them: coinciding ones joined by their energy, the loudest
 * at amplitude 1, as the fundamentals are in the published tables.
 * @param voices as they sound
 * @param a4Hz places them on the keys
 * @returns tones in no order; none for no voices
 * @example pureTonesOf([A4 and A5]) // A5 and the second partial of A4 are one tone
 */
export function pureTonesOf(
  voices: readonly Pick<VoiceSound, 'partials'>[],
  a4Hz: Hertz,
): readonly PureTone[] {
  const joined = new Map<number, { frequencyHz: Hertz; power: number }>();
  for (const { frequencyHz, levelDb } of voices.flatMap(({ partials }) => partials)) {
    const place = Math.round(midiOfFrequency(frequencyHz, a4Hz) * PLACES_PER_SEMITONE);
    const power = powerOf(levelDb) + (joined.get(place)?.power ?? 0);
    joined.set(place, { frequencyHz, power });
  }
  const tones = [...joined.values()];
  const loudest = tones.reduce((most, { power }) => Math.max(most, power), 0);
  return tones.map(({ frequencyHz, power }) => ({ frequencyHz, amplitude: Math.sqrt(power / loudest) }));
}

/**
 * The published models' roughness of a chord as it sounds.
 * @param voices as they sound
 * @returns each model's figure in its own unit; 0 for no voices
 * @source shared/hearing/roughness-models
 */
export function roughnessOf(
  voices: readonly Pick<VoiceSound, 'partials'>[],
  a4Hz: Hertz,
): Readonly<Record<RoughnessModel, number>> {
  const tones = pureTonesOf(voices, a4Hz);
  return {
    'hutchinson-knopoff': ROUGHNESS['hutchinson-knopoff'].measure(tones),
    sethares: ROUGHNESS.sethares.measure(tones),
    vassilakis: ROUGHNESS.vassilakis.measure(tones),
  };
}
