import { SECTIONS, type Section } from '#shared/strings/sections';
import { midiOfFrequency } from '#shared/pitch/tuning';
import { registerOf, type Register } from '#shared/voicing/registers';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { Hertz } from '#shared/units';

/** What of a chord is listened to. */
export type Listening =
  | { readonly kind: 'chord' }
  | { readonly kind: 'voice'; readonly id: string }
  | { readonly kind: 'pair'; readonly lowerId: string; readonly upperId: string }
  /** All voices, of each only the partials in one register. */
  | { readonly kind: 'register'; readonly register: Register; readonly a4Hz: Hertz }
  /** The chord as it would be after a move: not a part of it, but heard in its place. */
  | { readonly kind: 'trial'; readonly key: string; readonly sounds: readonly VoiceSound[] };

export const WHOLE_CHORD: Listening = { kind: 'chord' };

/** @returns whether two of them are the same part of the chord */
export function sameListening(a: Listening, b: Listening): boolean {
  if (a.kind === 'pair' && b.kind === 'pair') return a.lowerId === b.lowerId && a.upperId === b.upperId;
  if (a.kind === 'register' && b.kind === 'register') return a.register === b.register;
  if (a.kind === 'voice' && b.kind === 'voice') return a.id === b.id;
  if (a.kind === 'trial' && b.kind === 'trial') return a.key === b.key;
  return a.kind === 'chord' && b.kind === 'chord';
}

/** Sections heard alone, and sections left out. */
export interface Mix {
  readonly solo: readonly Section[];
  readonly out: readonly Section[];
}

export const EVERYBODY: Mix = { solo: [], out: [] };

function onlyRegister(sound: VoiceSound, register: Register, a4Hz: Hertz): VoiceSound {
  const partials = sound.partials.filter(
    ({ frequencyHz }) => registerOf(midiOfFrequency(frequencyHz, a4Hz)) === register,
  );
  return { ...sound, partials };
}

/**
 * The part of a chord that is listened to, each partial at the level that it has in the chord.
 * @returns voices without a partial in it are left away
 */
export function heardOf(sounds: readonly VoiceSound[], listening: Listening): readonly VoiceSound[] {
  switch (listening.kind) {
    case 'chord':
      return sounds;
    case 'voice':
      return sounds.filter(({ id }) => id === listening.id);
    case 'pair':
      return sounds.filter(({ id }) => id === listening.lowerId || id === listening.upperId);
    case 'register':
      return sounds
        .map((sound) => onlyRegister(sound, listening.register, listening.a4Hz))
        .filter(({ partials }) => partials.length > 0);
    case 'trial':
      return listening.sounds;
  }
}

/**
 * Which sections sound: the soloed ones, or all where none is; never one that is left out.
 * @example heardSections({ solo: ['cello'], out: [] }) // ['cello']
 */
export function heardSections({ solo, out }: Mix): readonly Section[] {
  return SECTIONS.filter(
    (section) => !out.includes(section) && (solo.length === 0 || solo.includes(section)),
  );
}

/** @returns the mix with a section's solo, or its leaving out, turned over; one takes the other back */
export function toggled(mix: Mix, part: keyof Mix, section: Section): Mix {
  const without = {
    solo: mix.solo.filter((other) => other !== section),
    out: mix.out.filter((other) => other !== section),
  };
  return mix[part].includes(section) ? without : { ...without, [part]: [...without[part], section] };
}
