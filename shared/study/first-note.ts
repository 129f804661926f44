import { midiOfName } from '#shared/pitch/names';
import { openStringsOf } from '#shared/strings/ranges';
import type { BassKind, Section } from '#shared/strings/sections';
import type { Chord } from '#shared/study/study.document';
import type { Midi } from '#shared/units';

/**
 * The note with which a section begins when somebody only says that it plays: an open string that it does not
 * have yet, from its second lowest upwards, since the lowest is for special weight. Chosen.
 * @example firstNote('cello', 'four-string', { voices: [] }) // 43, G2
 */
export function firstNote(section: Section, bass: BassKind, chord: Pick<Chord, 'voices'>): Midi {
  const rising = [...openStringsOf(section, bass)].sort((a, b) => a - b);
  const [lowest, second = lowest, ...others] = rising;
  const taken = new Set(
    chord.voices.filter((voice) => voice.section === section).map(({ pitch }) => midiOfName(pitch)),
  );
  const free = [second, ...others, lowest].find((midi) => midi !== undefined && !taken.has(midi));
  return free ?? second ?? 0;
}
