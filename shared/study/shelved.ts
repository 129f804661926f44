import { midiOfName, pitchName } from '#shared/pitch/names';
import { spellIn } from '#shared/pitch/spelling';
import type { Section } from '#shared/strings/sections';
import { dealToSections, type Reach } from '#shared/study/dealing';
import type { DraftDocument } from '#shared/study/draft';
import { comfortableReach } from '#shared/study/reach';
import { copyChord } from '#shared/study/study.changes';
import type { Chord, Voice } from '#shared/study/study.document';
import type { Midi, Semitones } from '#shared/units';

const OCTAVE: Semitones = 12;
/** Half an octave: from there on it is nearer to go the other way. */
const TRITONE: Semitones = 6;
/** C0 and B8: the bounds of a study's pitches. */
const [LOWEST, HIGHEST]: readonly [Midi, Midi] = [12, 119];

/** What of a study a voicing is fitted to. */
export type FittedTo = Pick<DraftDocument, 'key' | 'ensemble'>;

/**
 * @returns the smallest step from one key's tonic to another's, −5 to 6 semitones
 * @example stepBetween({ tonic: 'C' }, { tonic: 'A' }) // -3
 */
export function stepBetween(from: { readonly tonic: string }, to: { readonly tonic: string }): Semitones {
  const up = (midiOfName(`${to.tonic}4`) - midiOfName(`${from.tonic}4`) + OCTAVE * 2) % OCTAVE;
  return up > TRITONE ? up - OCTAVE : up;
}

/** Voices of a double stop are dealt together, all others by themselves; the lowest first. */
function groupsOf(voices: readonly Voice[]): readonly (readonly Voice[])[] {
  const groups = new Map<string, Voice[]>();
  for (const voice of voices) {
    const name = voice.stop === null ? voice.id : `${voice.section} ${voice.stop}`;
    groups.set(name, [...(groups.get(name) ?? []), voice]);
  }
  const lowest = (group: readonly Voice[]) => Math.min(...group.map(({ pitch }) => midiOfName(pitch)));
  return [...groups.values()].sort((a, b) => lowest(a) - lowest(b));
}

function isInReach({ section, pitch }: Voice, reach: Reach): boolean {
  const midi = midiOfName(pitch);
  return midi >= reach[section].low && midi <= reach[section].high;
}

/** Voicings stay with their sections where all can play them, and are dealt anew where one cannot. */
function dealt(voices: readonly Voice[], reach: Reach): readonly Voice[] {
  if (voices.every((voice) => isInReach(voice, reach))) return voices;
  const groups = groupsOf(voices);
  const sections = dealToSections(
    groups.map((group) => group.map(({ pitch }) => midiOfName(pitch))),
    reach,
  );
  const sectionOf = new Map<string, Section>();
  groups.forEach((group, place) => {
    const section = sections[place];
    for (const { id } of group) if (section) sectionOf.set(id, section);
  });
  return voices.map((voice) => {
    const section = sectionOf.get(voice.id) ?? voice.section;
    return section === voice.section ? voice : { ...voice, section, players: null, stop: voice.stop };
  });
}

/**
 * Fits a kept chord to a study: in its key or another, spelt by that, dealt to its sections where not all can play
 * what they had.
 * @param kept the chord, and the key that it stood in
 * @param study whose key and ensemble it is to stand under
 * @param octaves up, or down where negative
 * @param newId makes ids
 * @returns the chord under new ids; `null` where a note would leave the bounds of a study's pitches
 * @example fitChord({ chord, key: { tonic: 'C', mode: 'major' } }, inD, 0, newId) // a whole tone higher
 */
export function fitChord(
  kept: { readonly chord: Chord; readonly key: DraftDocument['key'] },
  study: FittedTo,
  octaves: number,
  newId: () => string,
): Chord | null {
  const shift = stepBetween(kept.key, study.key) + octaves * OCTAVE;
  const moved = kept.chord.voices.map((voice) => ({ voice, midi: midiOfName(voice.pitch) + shift }));
  if (moved.some(({ midi }) => midi < LOWEST || midi > HIGHEST)) return null;
  const transposed = moved.map(({ voice, midi }) =>
    shift === 0 ? voice : { ...voice, pitch: pitchName(spellIn(midi, study.key)), string: null },
  );
  const voices = dealt(transposed, comfortableReach(study.ensemble.bass)).map((voice) => {
    const tooMany = (voice.players ?? 0) > study.ensemble.players[voice.section];
    return tooMany ? { ...voice, players: null } : voice;
  });
  return copyChord({ ...kept.chord, voices }, newId);
}
