import { midiOfName } from '#shared/pitch/names';
import { playersOf } from '#shared/strings/divisi';
import type { GradedFinding } from '#shared/strings/grades';
import { stoppedFinding, stringReaches, voiceFinding } from '#shared/strings/reach';
import type { StringReach } from '#shared/strings/reach';
import type { BassKind, Section } from '#shared/strings/sections';
import { SECTIONS } from '#shared/strings/sections';
import type { Chord, Ensemble, Voice } from '#shared/study/study.document';
import type { Hertz } from '#shared/units';

/** A graded finding and the voices that it is about. */
export interface PlayingFinding extends GradedFinding {
  readonly kind: 'note' | 'stop' | 'divisi';
  readonly section: Section;
  readonly ids: readonly string[];
}

/**
 * How a chord lies under its players' hands: each note by its pitch, string and technique, each double stop by the
 * distance of the fingers, each section by whether its players go round.
 * @param chord 0 to 40 voices
 * @param a4Hz decides which natural harmonics sound a pitch
 * @returns every finding, the easy ones too, by section from the top of the score
 * @source shared/strings/reach, stops and divisi
 */
export function playingFindings(
  { voices }: Pick<Chord, 'voices'>,
  ensemble: Ensemble,
  a4Hz: Hertz,
): readonly PlayingFinding[] {
  return SECTIONS.flatMap((section) => {
    const own = voices.filter((voice) => voice.section === section);
    const notes = own.map((voice): PlayingFinding => ({
      ...voiceFinding(voice, ensemble.bass, a4Hz),
      ...{ kind: 'note', section, ids: [voice.id] },
    }));
    return [
      ...notes,
      ...stopFindings(own, section, ensemble.bass),
      ...divisiFindings(own, section, ensemble),
    ];
  });
}

function stopFindings(own: readonly Voice[], section: Section, bass: BassKind): readonly PlayingFinding[] {
  const stops = new Set(own.flatMap(({ stop }) => (stop === null ? [] : [stop])));
  return [...stops].flatMap((stop) => {
    const members = own.filter((voice) => voice.stop === stop);
    const finding = stoppedFinding(members, bass);
    return finding ? [{ ...finding, kind: 'stop', section, ids: members.map(({ id }) => id) }] : [];
  });
}

/** A section cannot be divided into more lines than it has players. */
function divisiFindings(
  own: readonly Voice[],
  section: Section,
  ensemble: Ensemble,
): readonly PlayingFinding[] {
  const players = playersOf(own, ensemble);
  const lines = new Map(
    own.map((voice) => [voice.stop === null ? voice.id : `stop ${voice.stop}`, voice.id]),
  );
  const needed = [...lines.values()].reduce((sum, id) => sum + (players.get(id) ?? 0), 0);
  const there = ensemble.players[section];
  if (needed <= there) return [];
  const reason = `${needed} players are needed and the section has ${there}`;
  return [{ grade: 'not playable', reason, kind: 'divisi', section, ids: own.map(({ id }) => id) }];
}

/**
 * The strings on which a note can be stopped or sounds open, the highest string first.
 * @param voice by its sounding pitch
 * @example stringsFor(cello A3, 'four-string').map(({ number }) => number) // [1, 2, 3]
 */
export function stringsFor(
  { section, pitch }: Pick<Voice, 'section' | 'pitch'>,
  bass: BassKind,
): readonly StringReach[] {
  const midi = midiOfName(pitch);
  return stringReaches(section, bass).filter(({ open, top }) => midi >= open && midi <= top);
}
