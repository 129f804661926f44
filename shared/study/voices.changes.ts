import { midiOfName, pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import type { Section } from '#shared/strings/sections';
import type { Chord, Voice } from '#shared/study/study.document';
import type { Midi, Semitones } from '#shared/units';

/** No note of a chord is moved beyond: A0, under the lowest string, and E8, where the measured axis ends. */
export const PITCH_LIMITS = { low: 21, high: 112 } as const;

/** What of a voice may be set by itself; pitch, section, stop and link have changes of their own. */
export type VoiceSettings = Partial<
  Pick<Voice, 'players' | 'technique' | 'dynamic' | 'string' | 'locked' | 'pitch'>
>;

/** @returns the voices, where a double stop or a link of one voice is none */
export function withoutLoners(voices: readonly Voice[]): Voice[] {
  const alone = (same: (other: Voice) => boolean): boolean => voices.filter(same).length < 2;
  return voices.map((voice) => {
    const { section, stop, link } = voice;
    const loneStop = stop !== null && alone((v) => v.section === section && v.stop === stop);
    const loneLink = link !== null && alone((v) => v.link === link);
    if (!loneStop && !loneLink) return voice;
    return { ...voice, stop: loneStop ? null : stop, link: loneLink ? null : link };
  });
}

function withVoices(chord: Chord, voices: readonly Voice[]): Chord {
  return { ...chord, voices: withoutLoners(voices) };
}

function mapVoice(chord: Chord, voiceId: string, change: (voice: Voice) => Voice): Chord {
  return withVoices(
    chord,
    chord.voices.map((voice) => (voice.id === voiceId ? change(voice) : voice)),
  );
}

/** @returns the chord with one voice more */
export function addVoice(chord: Chord, voice: Voice): Chord {
  return withVoices(chord, [...chord.voices, voice]);
}

/** @returns the chord without the voice; what it was joined or linked with stays */
export function removeVoice(chord: Chord, voiceId: string): Chord {
  return withVoices(
    chord,
    chord.voices.filter(({ id }) => id !== voiceId),
  );
}

function movedBy(voice: Voice, semitones: Semitones, key: SpellingKey): Voice {
  const midi = midiOfName(voice.pitch) + semitones;
  const within = Math.min(Math.max(midi, PITCH_LIMITS.low), PITCH_LIMITS.high);
  return { ...voice, pitch: pitchName(spellIn(within, key)) };
}

/**
 * Moves a voice, and with it every voice linked to it, and spells them as the key wants it.
 * @param midi where it goes; beyond {@link PITCH_LIMITS} it stops there
 * @returns the chord, the same one where nothing moves
 * @example moveVoice(chord, 'voice-1', 46, { tonic: 'F', mode: 'major' }) // the voice is Bb2
 */
export function moveVoice(chord: Chord, voiceId: string, midi: Midi, key: SpellingKey): Chord {
  const moved = chord.voices.find(({ id }) => id === voiceId);
  if (!moved) return chord;
  const semitones = midi - midiOfName(moved.pitch);
  if (semitones === 0) return chord;
  const goes = (voice: Voice): boolean =>
    voice === moved || (moved.link !== null && voice.link === moved.link);
  return withVoices(
    chord,
    chord.voices.map((voice) => (goes(voice) ? movedBy(voice, semitones, key) : voice)),
  );
}

/** @returns the chord with every note spelt as the key wants it; they sound as before */
export function respell(chord: Chord, key: SpellingKey): Chord {
  return { ...chord, voices: chord.voices.map((voice) => movedBy(voice, 0, key)) };
}

/** @returns the chord with some of a voice's settings changed; its linked voices stay as they are */
export function setVoice(chord: Chord, voiceId: string, settings: VoiceSettings): Chord {
  return mapVoice(chord, voiceId, (voice) => ({ ...voice, ...settings }));
}

/** @returns the chord with the voice given to another section; it leaves its double stop and its string */
export function changeSection(chord: Chord, voiceId: string, section: Section): Chord {
  return mapVoice(chord, voiceId, (voice) =>
    voice.section === section ? voice : { ...voice, section, stop: null, string: null, players: null },
  );
}
