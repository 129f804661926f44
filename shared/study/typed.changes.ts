import { newVoice } from '#shared/study/new-study';
import type { Chord, Voice } from '#shared/study/study.document';
import type { TypedVoice } from '#shared/study/typing-line';

type Match = (voice: Voice, typed: TypedVoice) => boolean;

const SAME_NOTE: Match = (voice, typed) => voice.section === typed.section && voice.pitch === typed.pitch;
const SAME_SECTION: Match = (voice, typed) => voice.section === typed.section;

/**
 * Gives a chord the voices of a typed line. A note that stood there keeps what is set of it (lock, players,
 * technique, link); one that only changed its pitch keeps it too, in the order of its section.
 * @param typed the line's voices
 * @param newId makes the id of a voice that is new
 * @returns the chord with exactly these voices
 * @example applyTyped(chord, typed, () => 'voice-9').voices.length // typed.length
 */
export function applyTyped(chord: Chord, typed: readonly TypedVoice[], newId: () => string): Chord {
  const free = [...chord.voices];
  const found = new Map<TypedVoice, Voice>();
  for (const match of [SAME_NOTE, SAME_SECTION]) {
    for (const wanted of typed) {
      const index = found.has(wanted) ? -1 : free.findIndex((voice) => match(voice, wanted));
      const [voice] = index < 0 ? [] : free.splice(index, 1);
      if (voice) found.set(wanted, voice);
    }
  }
  const voices = typed.map((wanted) => {
    const voice = found.get(wanted);
    const { section, pitch, stop } = wanted;
    return voice ? { ...voice, pitch, stop } : { ...newVoice(newId(), section, pitch), stop };
  });
  return { ...chord, voices };
}
