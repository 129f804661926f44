import type { Listening } from '@/audio/listening';
import { displayPitch } from '#shared/pitch/display';
import type { SoundingPartial } from '@/audio/schedule';
import { decibelText } from '@/components/playback/decibel-text';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { VoiceSound } from '#shared/voicing/analysis';

/** @returns a voice as its section's short name with its note */
export function voiceText(id: string, sounds: readonly VoiceSound[]): string {
  const sound = sounds.find((other) => other.id === id);
  if (!sound) return 'a note that is gone';
  return `${SECTION_FACTS[sound.section].short} ${displayPitch(sound.pitch, 'english')}`;
}

/** @returns what of the chord is heard alone, in words; nothing while it is the whole */
export function listeningText(listening: Listening, sounds: readonly VoiceSound[]): string | null {
  switch (listening.kind) {
    case 'chord':
      return null;
    case 'voice':
      return `Only ${voiceText(listening.id, sounds)}`;
    case 'pair':
      return `Only ${voiceText(listening.lowerId, sounds)} with ${voiceText(listening.upperId, sounds)}`;
    case 'register':
      return `Only what sounds in the ${listening.register} register`;
    case 'trial':
      return 'The chord as it would be after the move';
  }
}

/** @returns the partial that sounds by itself, in words: whose, which, how high and how strong */
export function partialText({ voiceId, n }: SoundingPartial, sounds: readonly VoiceSound[]): string {
  const name = voiceText(voiceId, sounds);
  const found = sounds.find(({ id }) => id === voiceId)?.partials.find((partial) => partial.n === n);
  if (!found) return `${name}, partial ${n}`;
  return `${name}, partial ${n}: ${found.frequencyHz.toFixed(1)} Hz, ${decibelText(found.levelDb)}`;
}
