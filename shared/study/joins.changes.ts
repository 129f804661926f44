import { midiOfName } from '#shared/pitch/names';
import type { Chord, Voice } from '#shared/study/study.document';
import type { Semitones } from '#shared/units';

const OCTAVE: Semitones = 12;

/** The first number that no double stop of the chord bears. */
function freeStop(chord: Chord): number {
  const used = new Set(chord.voices.map(({ stop }) => stop));
  let stop = 1;
  while (used.has(stop)) stop += 1;
  return stop;
}

function distance(a: Voice, b: Voice): Semitones {
  return Math.abs(midiOfName(a.pitch) - midiOfName(b.pitch));
}

function nearest(voice: Voice, others: readonly Voice[]): Voice | null {
  const [first] = [...others].sort((a, b) => distance(voice, a) - distance(voice, b));
  return first ?? null;
}

/**
 * The note with which a voice would be joined into a double stop: the nearest one of its section.
 * @returns that voice, or `null` where the section has no other or the two are joined already
 */
export function stopPartner(chord: Chord, voice: Voice): Voice | null {
  const joined = (other: Voice): boolean => voice.stop !== null && other.stop === voice.stop;
  const others = chord.voices.filter((other) => other.section === voice.section && other.id !== voice.id);
  return nearest(
    voice,
    others.filter((other) => !joined(other)),
  );
}

/** @returns the chord with two voices of one section joined, played together by all of their players */
export function joinStop(chord: Chord, voiceId: string, partner: Voice): Chord {
  const stop = partner.stop ?? freeStop(chord);
  const voices = chord.voices.map((voice) =>
    voice.id === voiceId || voice.id === partner.id ? { ...voice, stop } : voice,
  );
  return { ...chord, voices };
}

/** @returns the chord with the voice's double stop dissolved: its voices are divided */
export function divide(chord: Chord, voice: Voice): Chord {
  const { section, stop } = voice;
  const voices = chord.voices.map((other) =>
    other.section === section && other.stop === stop ? { ...other, stop: null } : other,
  );
  return { ...chord, voices };
}

/**
 * The voice to which another would be linked: the nearest one of another section at the unison or at octaves.
 * @returns that voice, or `null` where there is none
 */
export function linkPartner(chord: Chord, voice: Voice): Voice | null {
  return nearest(
    voice,
    chord.voices.filter((other) => other.section !== voice.section && distance(voice, other) % OCTAVE === 0),
  );
}

/** @returns the chord with two voices linked, and with what the partner is linked to already */
export function link(chord: Chord, voiceId: string, partner: Voice, newLink: string): Chord {
  const name = partner.link ?? newLink;
  const voices = chord.voices.map((voice) =>
    voice.id === voiceId || voice.id === partner.id ? { ...voice, link: name } : voice,
  );
  return { ...chord, voices };
}

/** @returns the chord with every voice of this link on its own */
export function unlink(chord: Chord, linkName: string): Chord {
  const voices = chord.voices.map((voice) => (voice.link === linkName ? { ...voice, link: null } : voice));
  return { ...chord, voices };
}
