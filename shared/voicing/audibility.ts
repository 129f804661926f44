import { erbRate } from '#shared/hearing/erb';
import { thresholdInQuiet } from '#shared/hearing/terhardt-1979';
import type { Decibels } from '#shared/units';
import type { Partial } from '#shared/voicing/analysis';

/**
 * Level at the listener of what the partials call 0 dB. A violinist's mf is 84 dB sound power; ten metres away
 * in a hall about 24 dB of that are lost.
 * @source Meyer 2009 for the power, from memory; the loss of distance and hall from memory of room acoustics
 */
const LISTENER_LEVEL: Decibels = 60;
/** A partial so much louder in the same band hides another. */
export const MASKING: Decibels = 20;

/** @returns the number of the equivalent rectangular bandwidth in which a partial lies, 0 the lowest */
export function bandNumber({ frequencyHz }: Pick<Partial, 'frequencyHz'>): number {
  return Math.floor(erbRate(frequencyHz));
}

/** @returns whether a partial lies above the threshold in quiet where the listener sits */
export function isAboveThreshold({
  frequencyHz,
  levelDb,
}: Pick<Partial, 'frequencyHz' | 'levelDb'>): boolean {
  return levelDb + LISTENER_LEVEL > thresholdInQuiet(frequencyHz);
}

/** @returns the loudest partial of each band */
export function loudestByBand(partials: readonly Partial[]): ReadonlyMap<number, Decibels> {
  const loudest = new Map<number, Decibels>();
  for (const partial of partials) {
    const band = bandNumber(partial);
    const known = loudest.get(band);
    if (known === undefined || partial.levelDb > known) loudest.set(band, partial.levelDb);
  }
  return loudest;
}

/** @returns whether a partial is heard: above the threshold and not masked in its band */
export function isAudible(partial: Partial, loudest: ReadonlyMap<number, Decibels>): boolean {
  const masker = loudest.get(bandNumber(partial)) ?? -Infinity;
  return isAboveThreshold(partial) && masker - partial.levelDb < MASKING;
}
