import type { VoiceSound } from '#shared/voicing/analysis';
import type { Decibels } from '#shared/units';

const DB_PER_DECADE_OF_AMPLITUDE = 20;
const DB_PER_DECADE_OF_ENERGY = 10;

/**
 * How loud the loudest chord of what is played is made, before the volume: the energy of all its partials
 * together, as a sum of squared amplitudes. −15 dB is −18 dB rms under full scale, which leaves a dense chord
 * its peaks, about 12 dB over its rms.
 * @source chosen for headroom; the peak of many unrelated partials measured in the tests
 */
export const FULL_CHORD_LEVEL: Decibels = -15;

/**
 * @param levelDb a level in decibels, −Infinity for nothing
 * @returns the amplitude against 0 dB
 * @example amplitudeOf(20) // 10
 */
export function amplitudeOf(levelDb: Decibels): number {
  return 10 ** (levelDb / DB_PER_DECADE_OF_AMPLITUDE);
}

/**
 * The inverse of {@link amplitudeOf}.
 * @param amplitude ≥ 0
 * @returns decibels, −Infinity for 0
 * @example levelOf(10) // 20
 */
export function levelOf(amplitude: number): Decibels {
  return DB_PER_DECADE_OF_AMPLITUDE * Math.log10(amplitude);
}

/**
 * The joint level of all partials of a chord, their energies added.
 * @returns decibels on the partials' own scale, −Infinity where nothing sounds
 * @example chordLevel([]) // -Infinity
 */
export function chordLevel(sounds: readonly VoiceSound[]): Decibels {
  const energy = sounds
    .flatMap((sound) => sound.partials)
    .reduce((sum, partial) => sum + amplitudeOf(partial.levelDb) ** 2, 0);
  return DB_PER_DECADE_OF_ENERGY * Math.log10(energy);
}

/**
 * One common scale for everything that is played together or in turn: what is softer in the score stays
 * softer by as much, and only the whole is brought to a level that suits loudspeakers.
 * @param chords every chord that is to stand on the scale
 * @returns the level of the loudest, −Infinity where none sounds
 * @example loudestLevel([quiet, loud]) // chordLevel(loud)
 */
export function loudestLevel(chords: readonly (readonly VoiceSound[])[]): Decibels {
  return chords.reduce((loudest, sounds) => Math.max(loudest, chordLevel(sounds)), -Infinity);
}

/**
 * @param loudest of the chords on the scale, as {@link loudestLevel} gives it
 * @returns the factor that brings the amplitudes of partials to full scale 1; 0 where nothing sounds
 * @example scaleFor(FULL_CHORD_LEVEL) // 1
 */
export function scaleFor(loudest: Decibels): number {
  return Number.isFinite(loudest) ? amplitudeOf(FULL_CHORD_LEVEL - loudest) : 0;
}
