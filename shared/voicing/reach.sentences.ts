import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { midiOfName, pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import { rangeOf } from '#shared/strings/ranges';
import { SECTION_FACTS, type BassKind } from '#shared/strings/sections';
import type { Voice } from '#shared/study/study.document';
import { sentence } from '#shared/voicing/words';

/** How a note lies on its instrument: in reach, high for it, or out of an orchestra's or anybody's reach. */
export type Lying = 'comfortable' | 'extreme' | 'beyond';

/** How a note lies for its section, and the sentence that says so. */
export interface ReachFinding {
  readonly voiceId: string;
  readonly lying: Lying;
  /** Null where there is nothing to say. */
  readonly text: string | null;
}

/**
 * Says where a note lies on the instruments that have it. Nothing is forbidden: a note out of reach is told.
 * @param bass the kind of double bass
 * @param key for spelling the edge of the range
 * @example reachOf(cello B1, 'four-string', key, 'english').text // 'B1 lies under the lowest note of the cellos, C2.'
 */
export function reachOf(
  voice: Pick<Voice, 'id' | 'section' | 'pitch'>,
  bass: BassKind,
  key: SpellingKey,
  naming: NoteNaming,
): ReachFinding {
  const { lowest, comfortableTop, orchestralTop, soloTop } = rangeOf(voice.section, bass);
  const midi = midiOfName(voice.pitch);
  const note = displayPitch(voice.pitch, naming);
  const who = SECTION_FACTS[voice.section].plural;
  const edge = (at: number): string => displayPitch(pitchName(spellIn(at, key)), naming);
  const say = (lying: Lying, text: string | null): ReachFinding => ({
    voiceId: voice.id,
    lying,
    text: text === null ? null : sentence(text),
  });
  if (midi < lowest)
    return say('beyond', `${note} lies under the lowest note of the ${who}, ${edge(lowest)}.`);
  if (midi > soloTop)
    return say('beyond', `${note} lies over what ${who} reach, ${edge(soloTop)} at the most.`);
  if (midi > orchestralTop) {
    return say(
      'beyond',
      `${note} lies over what a section of ${who} is asked for, ${edge(orchestralTop)}; a soloist reaches it.`,
    );
  }
  if (midi > comfortableTop) return say('extreme', `${note} is high for the ${who}.`);
  return say('comfortable', null);
}
