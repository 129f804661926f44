import type { Midi } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';

/**
 * The loudspeakers of laptops and phones sound little below about C3, 131 Hz.
 * @source order of magnitude from memory; devices differ, which is why the notice speaks of no exact note
 */
const SMALL_SPEAKERS_REACH: Midi = 48;

/** @returns whether a chord has notes that a laptop's or phone's loudspeaker hardly sounds */
export function liesBelowSmallSpeakers(sounds: readonly VoiceSound[]): boolean {
  return sounds.some(({ midi }) => midi < SMALL_SPEAKERS_REACH);
}
