import type { VoiceSound } from '#shared/voicing/analysis';

const OCTAVE = 2;
const SEMITONES_PER_OCTAVE = 12;

/**
 * A chord as it stands, but every partial an octave higher, for loudspeakers that do not sound the lowest ones.
 * @returns the same levels; beats are twice as fast
 * @example octaveHigher([voice])[0].midi // voice.midi + 12
 */
export function octaveHigher(sounds: readonly VoiceSound[]): readonly VoiceSound[] {
  return sounds.map((sound) => ({
    ...sound,
    midi: sound.midi + SEMITONES_PER_OCTAVE,
    partials: sound.partials.map((partial) => ({ ...partial, frequencyHz: partial.frequencyHz * OCTAVE })),
  }));
}
