import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { Midi } from '#shared/units';
import type { SectionPair } from '#shared/voicing/section-pairs';
import type { SiltlineMap } from '#shared/voicing/siltline-map';
import { semitonesText } from '#shared/voicing/words';

/** Up to this index two notes stand clear of their limit. */
const LINE = 50;

/**
 * The room that a note needs above it, in words.
 * @param map for the two sections
 * @param midi the lower note
 * @returns null where the note lies off the map
 * @example roomText(map, pair, 36, key, 'english')
 * // 'Room above C2, cellos with cellos above: clear from 15 semitones up, at E♭3; nearer, clear at 7 and 12 semitones.'
 */
export function roomText(
  map: SiltlineMap,
  { lower, upper }: Pick<SectionPair, 'lower' | 'upper'>,
  midi: Midi,
  key: SpellingKey,
  naming: NoteNaming,
): string | null {
  const indices = map.index[midi - map.lowest];
  if (!indices) return null;
  const name = (at: Midi): string => displayPitch(pitchName(spellIn(at, key)), naming);
  const who = `${SECTION_FACTS[lower.section].plural} with ${SECTION_FACTS[upper.section].plural} above`;
  const last = indices.findLastIndex((index) => index > LINE);
  const from = last + 2;
  const nearer = indices.flatMap((index, i) => (index <= LINE && i < last ? [i + 1] : []));
  const head = `Room above ${name(midi)}, ${who}:`;
  if (last < 0) return `${head} clear at every interval.`;
  const clear =
    from > indices.length
      ? `not clear within ${semitonesText(indices.length)}`
      : `clear from ${semitonesText(from)} up, at ${name(midi + from)}`;
  const islands = nearer.length > 0 ? `; nearer, clear at ${listed(nearer)}` : '';
  return `${head} ${clear}${islands}.`;
}

function listed(semitones: readonly number[]): string {
  const last = semitones.at(-1) ?? 0;
  if (semitones.length === 1) return semitonesText(last);
  return `${semitones.slice(0, -1).join(', ')} and ${semitonesText(last)}`;
}
