import { bodyGain } from '#shared/acoustics/body';
import { brightnessGain } from '#shared/acoustics/level';
import { excitationLevel, partialCount } from '#shared/acoustics/technique';
import type { Instrument } from '#shared/strings/sections';
import type { Dynamic, Technique } from '#shared/study/study.document';
import type { Hertz } from '#shared/units';
import type { Partial } from '#shared/voicing/analysis';

/** Partials above this are left out: they add nothing below, and players' upper partials fade there. */
export const HIGHEST_PARTIAL_HZ: Hertz = 10_000;

/** A tone by what shapes its spectrum. */
export interface ToneSource {
  readonly instrument: Instrument;
  readonly technique: Technique;
  readonly dynamic: Dynamic;
  readonly f0Hz: Hertz;
}

/**
 * The partials of a tone: at n times the fundamental, up to 32 and 10 kHz, shaped by bow or finger, technique,
 * dynamic and body.
 * @returns partials whose levels leave the voice's nominal level out: add it
 * @source a bowed string is harmonic (stick-slip motion locks its modes): Cremer, The Physics of the Violin
 * @example spectrumOf({ instrument: 'cello', technique, dynamic: 'mf', f0Hz: 220 })[1]?.frequencyHz // 440
 */
export function spectrumOf({ instrument, technique, dynamic, f0Hz }: ToneSource): readonly Partial[] {
  const partials: Partial[] = [];
  for (let n = 1; n <= partialCount(technique); n += 1) {
    const frequencyHz = n * f0Hz;
    if (n > 1 && frequencyHz > HIGHEST_PARTIAL_HZ) break;
    const levelDb =
      excitationLevel(technique, n, frequencyHz) +
      bodyGain(instrument, frequencyHz) +
      brightnessGain(dynamic, frequencyHz);
    partials.push({ n, frequencyHz, levelDb });
  }
  return partials;
}
