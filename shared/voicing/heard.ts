import type { VoiceSound } from '#shared/voicing/analysis';
import { hearPartials, isHeard } from '#shared/voicing/audibility';
import { loudestByBand } from '#shared/voicing/density';

/**
 * Which partials of a chord are heard: above the threshold in quiet where the listener sits, and not masked by one
 * 20 dB louder in the same band.
 * @param voices as they sound
 * @returns the numbers of the heard partials of each voice, by its id
 * @source shared/voicing/audibility
 */
export function heardNumbers(
  voices: readonly Pick<VoiceSound, 'id' | 'partials'>[],
): ReadonlyMap<string, ReadonlySet<number>> {
  const heard = hearPartials(voices);
  const loudest = loudestByBand(heard);
  return new Map(
    voices.map(({ id, partials }, voice) => {
      const start = heard.starts[voice] ?? 0;
      const numbers = partials.flatMap(({ n }, i) => {
        const band = heard.bands[start + i] ?? 0;
        return isHeard(heard, start + i, loudest[band] ?? -Infinity) ? [n] : [];
      });
      return [id, new Set(numbers)];
    }),
  );
}
