import { newVoice } from '#shared/study/new-study';
import type { Chord, Voice } from '#shared/study/study.document';
import type { TypedVoice } from '#shared/study/typing-line';
import { withoutLoners } from '#shared/study/voices.changes';

type Match = (voice: Voice, typed: TypedVoice) => boolean;

const SAME_NOTE: Match = (voice, typed) => voice.section === typed.section && voice.pitch === typed.pitch;
const SAME_SECTION: Match = (voice, typed) => voice.section === typed.section;

function matched(chord: Chord, typed: readonly TypedVoice[]): ReadonlyMap<TypedVoice, Voice> {
  const free = [...chord.voices];
  const found = new Map<TypedVoice, Voice>();
  for (const match of [SAME_NOTE, SAME_SECTION]) {
    for (const wanted of typed) {
      const index = found.has(wanted) ? -1 : free.findIndex((voice) => match(voice, wanted));
      const [voice] = index < 0 ? [] : free.splice(index, 1);
      if (voice) found.set(wanted, voice);
    }
  }
  return found;
}

/** The name that a link keeps from a voice that had it, so that a line read again changes nothing. */
function linkNames(found: ReadonlyMap<TypedVoice, Voice>, newId: () => string) {
  const names = new Map<number, string>();
  return (number: number): string => {
    const kept = [...found].find(([{ how }, { link }]) => how?.link === number && link !== null)?.[1].link;
    const taken = [...names].some(([other, name]) => other !== number && name === kept);
    const name = names.get(number) ?? (taken ? null : kept) ?? newId();
    names.set(number, name);
    return name;
  };
}

/**
 * Gives a chord the voices of a typed line. A note that stood there stays the same voice, with the remarks that
 * hang on it; so does one that only changed its pitch, in the order of its section. It is played as the line
 * says; where the line is silent on that, as before.
 * @param typed the line's voices
 * @param newId makes the id of a voice or a link that is new
 * @returns the chord with exactly these voices
 * @example applyTyped(chord, typed, () => 'voice-9').voices.length // typed.length
 */
export function applyTyped(chord: Chord, typed: readonly TypedVoice[], newId: () => string): Chord {
  const found = matched(chord, typed);
  const linkName = linkNames(found, newId);
  const voices = typed.map((wanted) => {
    const { section, pitch, stop, how } = wanted;
    const voice = found.get(wanted) ?? newVoice(newId(), section, pitch);
    if (!how) return { ...voice, pitch, stop };
    return { ...voice, pitch, stop, ...how, link: how.link === null ? null : linkName(how.link) };
  });
  return { ...chord, voices: withoutLoners(voices) };
}
