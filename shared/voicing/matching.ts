import type { Section } from '#shared/strings/sections';
import type { Midi, Semitones } from '#shared/units';

/** What of a note tells it from others. */
export interface MatchNote {
  readonly id: string;
  readonly section: Section;
  readonly midi: Midi;
}

/** A note of the one voicing and the note that has its part in the other; `null` where there is none. */
export interface NoteMatch<Note extends MatchNote> {
  readonly held: Note | null;
  readonly now: Note | null;
}

interface Rest<Note extends MatchNote> {
  held: readonly Note[];
  now: readonly Note[];
}

type Pair<Note> = readonly [held: Note, now: Note];

/** Takes each held note's counterpart out of the rest, first come first served. */
function takePairs<Note extends MatchNote>(
  rest: Rest<Note>,
  isSame: (held: Note, now: Note) => boolean,
): readonly Pair<Note>[] {
  const free = new Set(rest.now);
  const pairs = rest.held.flatMap((held): readonly Pair<Note>[] => {
    const now = [...free].find((other) => isSame(held, other));
    if (!now) return [];
    free.delete(now);
    return [[held, now]];
  });
  const taken = new Set(pairs.map(([held]) => held));
  rest.held = rest.held.filter((note) => !taken.has(note));
  rest.now = rest.now.filter((note) => free.has(note));
  return pairs;
}

/** The cheapest way to pair notes that keep their order: how far they move together, and who goes where. */
interface Way<Note> {
  readonly semitones: Semitones;
  readonly pairs: readonly Pair<Note>[];
}

/**
 * Pairs two lists of notes from the bottom up without crossing: every note of the shorter one gets a
 * counterpart, and together they move as little as they can.
 * @param held rising
 * @param now rising
 */
function orderedPairs<Note extends MatchNote>(
  held: readonly Note[],
  now: readonly Note[],
): readonly Pair<Note>[] {
  const turned = held.length > now.length;
  const [few, many] = turned ? [now, held] : [held, now];
  // ways[i]: the best way of the first i of the few among those of the many that were seen so far.
  let ways: (Way<Note> | undefined)[] = [{ semitones: 0, pairs: [] }];
  for (const other of many) {
    ways = few.reduce<(Way<Note> | undefined)[]>(
      (next, note, index) => {
        const [before, kept] = [ways[index], ways[index + 1]];
        const semitones = before && before.semitones + Math.abs(note.midi - other.midi);
        const better = before && semitones !== undefined && (!kept || semitones < kept.semitones);
        const pair: Pair<Note> = turned ? [other, note] : [note, other];
        next.push(better ? { semitones, pairs: [...before.pairs, pair] } : kept);
        return next;
      },
      [ways[0]],
    );
  }
  return ways[few.length]?.pairs ?? [];
}

/** Pairs what is left within each section. */
function sectionPairs<Note extends MatchNote>(rest: Rest<Note>): readonly Pair<Note>[] {
  const rising = (notes: readonly Note[]): readonly Note[] => [...notes].sort((a, b) => a.midi - b.midi);
  const sections = [...new Set(rest.held.map(({ section }) => section))];
  const pairs = sections.flatMap((section) => {
    const own = (notes: readonly Note[]) => rising(notes.filter((note) => note.section === section));
    return orderedPairs(own(rest.held), own(rest.now));
  });
  const taken = new Set(pairs.flat());
  rest.held = rest.held.filter((note) => !taken.has(note));
  rest.now = rest.now.filter((note) => !taken.has(note));
  return pairs;
}

/**
 * Finds which note of one voicing has whose part in another: first what sounds the same in the same section,
 * then what bears the same id, then what the same section plays, without crossing and with the least motion,
 * last what another section has taken over at the same pitch.
 * @param held notes of the one
 * @param now notes of the other
 * @returns every note of both once, from the top down
 * @example matchNotes([cello A2], [cello F3]) // [{ held: cello A2, now: cello F3 }]
 */
export function matchNotes<Note extends MatchNote>(
  held: readonly Note[],
  now: readonly Note[],
): readonly NoteMatch<Note>[] {
  const rest: Rest<Note> = { held, now };
  const isUnmoved = (a: Note, b: Note): boolean => a.section === b.section && a.midi === b.midi;
  const pairs = [
    ...takePairs(rest, (a, b) => a.id === b.id && isUnmoved(a, b)),
    ...takePairs(rest, isUnmoved),
    ...takePairs(rest, (a, b) => a.id === b.id),
    ...sectionPairs(rest),
    ...takePairs(rest, (a, b) => a.midi === b.midi),
  ];
  const matches: NoteMatch<Note>[] = [
    ...pairs.map(([one, other]) => ({ held: one, now: other })),
    ...rest.held.map((note) => ({ held: note, now: null })),
    ...rest.now.map((note) => ({ held: null, now: note })),
  ];
  const height = (match: NoteMatch<Note>): Midi => match.now?.midi ?? match.held?.midi ?? 0;
  return matches.sort((a, b) => height(b) - height(a));
}
