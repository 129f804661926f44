import { midiOfName } from '#shared/pitch/names';
import type { SpellingKey } from '#shared/pitch/spelling';
import type { Chord, Technique, Voice } from '#shared/study/study.document';
import { PITCH_LIMITS, moveVoice, removeVoice, type VoiceSettings } from '#shared/study/voices.changes';
import type { Semitones } from '#shared/units';

/** Ids of the notes that a change is for. */
export type Selected = readonly string[];

/** What of several notes may be set at once. */
export type SelectedSettings = Omit<VoiceSettings, 'pitch' | 'technique'> & {
  readonly technique?: Partial<Technique>;
};

/**
 * Moves notes together, and with each what is linked to it.
 * @param semitones up, or down where negative; nothing moves where one of them would leave the limits
 * @returns the chord, the same one where nothing moves
 * @example moveSelected(chord, ['voice-1', 'voice-2'], 12, key) // both an octave up
 */
export function moveSelected(chord: Chord, ids: Selected, semitones: Semitones, key: SpellingKey): Chord {
  const moving = movingWith(chord, ids);
  if (semitones === 0 || !moving.every(({ pitch }) => isWithin(midiOfName(pitch) + semitones))) return chord;
  // One of each link takes the others along.
  const leading = moving.filter(
    ({ link }, index) => link === null || moving.findIndex((other) => other.link === link) === index,
  );
  return leading.reduce(
    (moved, { id, pitch }) => moveVoice(moved, id, midiOfName(pitch) + semitones, key),
    chord,
  );
}

/** @returns the notes that move when these are moved: they, and what is linked to them */
export function movingWith(chord: Chord, ids: Selected): readonly Voice[] {
  const chosen = chord.voices.filter(({ id }) => ids.includes(id));
  const links = new Set(chosen.map(({ link }) => link).filter((link) => link !== null));
  return chord.voices.filter(
    (voice) => chosen.includes(voice) || (voice.link !== null && links.has(voice.link)),
  );
}

/** @returns whether a note may stand there */
export function isWithin(midi: number): boolean {
  return midi >= PITCH_LIMITS.low && midi <= PITCH_LIMITS.high;
}

/** @returns the chord with some settings of several notes changed; what is not named stays */
export function setSelected(chord: Chord, ids: Selected, settings: SelectedSettings): Chord {
  const { technique, ...others } = settings;
  const voices = chord.voices.map((voice) =>
    ids.includes(voice.id) ? { ...voice, ...others, technique: { ...voice.technique, ...technique } } : voice,
  );
  return { ...chord, voices };
}

/** @returns the chord without these notes */
export function removeSelected(chord: Chord, ids: Selected): Chord {
  return ids.reduce(removeVoice, chord);
}

/** @returns what all of them have in common, or `null` where they differ */
export function common<Value>(voices: readonly Voice[], of: (voice: Voice) => Value): Value | null {
  const [first, ...others] = voices.map(of);
  return first !== undefined && others.every((other) => other === first) ? first : null;
}
