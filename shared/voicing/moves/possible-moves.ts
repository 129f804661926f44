import type { Pitch } from '#shared/pitch/names';
import { midiOf, midiOfName, parsePitch, pitchName } from '#shared/pitch/names';
import { rangeOf } from '#shared/strings/ranges';
import type { BassKind, Section } from '#shared/strings/sections';
import { SECTIONS } from '#shared/strings/sections';
import type { Voice } from '#shared/study/study.document';
import type { Midi, Semitones } from '#shared/units';
import type { Move, MoveKind } from '#shared/voicing/moves/moves';

const HIGHEST_OCTAVE = 8;
const OCTAVE: Semitones = 12;

/**
 * Every single move of a chord's voices: an octave up or down, to the next chord tone either way, to another
 * section that reaches the note, left out. Locked voices stay; linked ones move together.
 * @param voices of one chord
 * @param bassKind decides how low the double basses reach
 * @param asked whether moves of a voice, and of those linked to it, are wanted
 * @example possibleMoves([lockedVoice], 'four-string') // []
 */
export function possibleMoves(
  voices: readonly Voice[],
  bassKind: BassKind,
  asked: (voice: Voice) => boolean = () => true,
): readonly Move[] {
  const tones = chordTones(voices);
  return movable(voices)
    .filter((group) => group.some(asked))
    .flatMap((group) => [
      ...shifts(group, bassKind, tones),
      ...otherSections(group, bassKind),
      ...leftOut(group, voices.length),
    ]);
}

/** Voices that move as one; a group with a locked voice does not move. */
function movable(voices: readonly Voice[]): readonly (readonly Voice[])[] {
  const groups = new Map<string, Voice[]>();
  for (const voice of voices) {
    const key = voice.link === null ? `voice ${voice.id}` : `link ${voice.link}`;
    groups.set(key, [...(groups.get(key) ?? []), voice]);
  }
  return [...groups.values()].filter((group) => group.every(({ locked }) => !locked));
}

/** The chord's notes as spelt, each once, without their octaves. */
function chordTones(voices: readonly Voice[]): readonly Pitch[] {
  const tones = new Map<string, Pitch>();
  for (const { pitch } of voices) {
    const parsed = parsePitch(pitch);
    if (parsed) tones.set(`${parsed.letter}${parsed.alteration}`, { ...parsed, octave: 0 });
  }
  return [...tones.values()];
}

function shifts(group: readonly Voice[], bassKind: BassKind, tones: readonly Pitch[]): readonly Move[] {
  const [lead] = group;
  const from = lead ? parsePitch(lead.pitch) : null;
  if (!from) return [];
  const octave = (by: number): Pitch => ({ ...from, octave: from.octave + by });
  const goals: readonly (readonly [MoveKind, Pitch | undefined])[] = [
    ['octaveUp', octave(1)],
    ['octaveDown', octave(-1)],
    ['chordTone', nextTone(from, tones, 1)],
    ['chordTone', nextTone(from, tones, -1)],
  ];
  return goals.flatMap(([kind, to]) => (to ? shiftOf(group, kind, from, to, bassKind) : []));
}

/** The nearest other tone of the chord above or below. */
function nextTone(from: Pitch, tones: readonly Pitch[], way: 1 | -1): Pitch | undefined {
  const here = midiOf(from);
  let nearest: Pitch | undefined;
  let least = Infinity;
  for (const tone of tones) {
    // The tones have octave 0: this far up or down to the first beyond the note itself.
    const octave = Math.floor((way * (here - midiOf(tone))) / OCTAVE) + 1;
    const away = way * (midiOf(tone) - here) + OCTAVE * octave;
    if (away >= least) continue;
    least = away;
    nearest = { ...tone, octave: way * octave };
  }
  return nearest;
}

/** Moves a whole group as its first voice moves, where all of it stays within reach. */
function shiftOf(
  group: readonly Voice[],
  kind: MoveKind,
  from: Pitch,
  to: Pitch,
  bassKind: BassKind,
): readonly Move[] {
  const [lead] = group;
  const pitches = group.map(({ pitch }) => {
    const own = parsePitch(pitch);
    return own ? { ...to, octave: to.octave + own.octave - from.octave } : to;
  });
  const reached = group.every(({ section }, i) => {
    const pitch = pitches[i] ?? to;
    return pitch.octave >= 0 && pitch.octave <= HIGHEST_OCTAVE && reaches(section, midiOf(pitch), bassKind);
  });
  if (!lead || !reached) return [];
  return [{ kind, ids: group.map(({ id }) => id), pitches: pitches.map(pitchName), section: lead.section }];
}

function otherSections(group: readonly Voice[], bassKind: BassKind): readonly Move[] {
  const [voice, ...linked] = group;
  if (!voice || linked.length > 0 || voice.stop !== null) return [];
  return SECTIONS.filter(
    (section) => section !== voice.section && reaches(section, midiOfName(voice.pitch), bassKind),
  ).map((section) => ({ kind: 'section', ids: [voice.id], pitches: [voice.pitch], section }));
}

function leftOut(group: readonly Voice[], voices: number): readonly Move[] {
  const [lead] = group;
  if (!lead || group.length >= voices) return [];
  return [{ kind: 'leaveOut', ids: group.map(({ id }) => id), pitches: [], section: lead.section }];
}

function reaches(section: Section, midi: Midi, bassKind: BassKind): boolean {
  const { lowest, orchestralTop } = rangeOf(section, bassKind);
  return midi >= lowest && midi <= orchestralTop;
}
