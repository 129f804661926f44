import type { SoundEngine } from '@/audio/sound-engine';
import type { Decibels } from '#shared/units';

/** Fetches what makes sound when somebody first wants to hear something, and not before. */
export async function loadSoundEngine(volume: Decibels, room: boolean): Promise<SoundEngine> {
  Object.assign(window, { TONE_SILENCE_LOGGING: true });
  const { createSoundEngine } = await import('@/audio/tone-engine');
  return createSoundEngine(volume, room);
}
