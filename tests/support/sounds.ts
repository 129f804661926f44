import { techniqueSchema } from '#shared/study/study.document';
import type { Partial as SoundPartial, VoiceSound } from '#shared/voicing/analysis';

/** A harmonic series with the level of each partial, in decibels. */
export function seriesOn(fundamentalHz: number, levels: readonly number[]): readonly SoundPartial[] {
  return levels.map((levelDb, index) => ({
    n: index + 1,
    frequencyHz: (index + 1) * fundamentalHz,
    levelDb,
  }));
}

/** A voice made to sound, for tests that say only what matters to them. */
export function voiceSound(id: string, of: Partial<VoiceSound> = {}): VoiceSound {
  return {
    id,
    section: 'cello',
    pitch: 'A2',
    midi: 45,
    players: 1,
    technique: techniqueSchema.parse({}),
    dynamic: 'mf',
    partials: seriesOn(110, [0]),
    ...of,
  };
}
