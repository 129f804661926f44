import type { Section } from '#shared/strings/sections';
import { compareVoicings, type NoteChange } from '#shared/voicing/comparison';
import { laneNotes, type LaneNote, type ShownChord } from '@/components/bench/lane-notes';
import type { HeldVoicing } from '@/components/compare/held-voicing';

/** A note of the held voicing that is not where it was: gone for good, or moved away. */
export interface Ghost {
  readonly id: string;
  readonly section: Section;
  readonly name: string;
  readonly y: number;
  readonly left: number;
  readonly gone: boolean;
  /** A note of the voicing now stands so near that the name would be covered. */
  readonly crowded: boolean;
}

/** A ring round a note of the voicing now that is new, has moved or is played otherwise. */
export interface Ring {
  readonly note: LaneNote;
  readonly kind: 'new' | 'moved' | 'played';
}

/** From where a note stood to where it stands, in per cent across and pixels down. */
export interface Motion {
  readonly id: string;
  readonly section: Section;
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
  /** So short that it stands beside the note, not between the two. */
  readonly near: boolean;
}

export interface HeldMarks {
  readonly ghosts: readonly Ghost[];
  readonly rings: readonly Ring[];
  readonly motions: readonly Motion[];
}

interface Shown extends ShownChord {
  readonly held: HeldVoicing;
}

/** Half the height of a token with its ring, in pixels: lines end where it begins. */
const TOKEN_HALF = 15;
const TOKEN_HEIGHT = 22;
/** Tokens nearer than this, in per cent of all lanes, lie over each other. */
const TOKEN_WIDTH = 13;

function motionOf(change: NoteChange, from: LaneNote, to: LaneNote): readonly Motion[] {
  const down = Math.sign(to.y - from.y);
  const isFar = Math.abs(to.y - from.y) > 2 * TOKEN_HALF || Math.abs(to.left - from.left) > TOKEN_WIDTH;
  if (!change.now) return [];
  const { id, section } = change.now;
  if (!isFar) return [{ id, section, x1: to.left, y1: from.y, x2: to.left, y2: to.y, near: true }];
  const [y1, y2] = [from.y + down * (TOKEN_HEIGHT / 2), to.y - down * TOKEN_HALF];
  return [{ id, section, x1: from.left, y1, x2: to.left, y2, near: false }];
}

/**
 * The marks that lay the held voicing over the lanes of the one now.
 * @param laneWidth in pixels; 0 while it is not known
 */
export function heldMarks({ held, chord, analysis, ensemble, ...frame }: Shown, laneWidth = 0): HeldMarks {
  const place = (notes: readonly LaneNote[]) => new Map(notes.map((note) => [note.voice.id, note]));
  const before = place(laneNotes({ ...held, ...frame }, laneWidth));
  const after = place(laneNotes({ chord, analysis, ensemble, ...frame }, laneWidth));
  const changes = compareVoicings(held.analysis, analysis).notes.filter(({ kind }) => kind !== 'stays');
  const covers = (note: LaneNote): boolean =>
    [...after.values()].some(
      ({ y, left }) => Math.abs(y - note.y) < TOKEN_HEIGHT && Math.abs(left - note.left) < TOKEN_WIDTH,
    );
  const ghosts = changes.flatMap(({ kind, held: was }): readonly Ghost[] => {
    const note = was && kind !== 'played' ? before.get(was.id) : undefined;
    if (!note) return [];
    const { name, y, left, voice } = note;
    return [
      { id: voice.id, section: voice.section, name, y, left, gone: kind === 'gone', crowded: covers(note) },
    ];
  });
  const rings = changes.flatMap(({ kind, now }): readonly Ring[] => {
    const note = now ? after.get(now.id) : undefined;
    if (!note) return [];
    return [{ note, kind: kind === 'new' || kind === 'played' ? kind : 'moved' }];
  });
  const motions = changes.flatMap((change) => {
    if (change.kind !== 'moved' && change.kind !== 'given') return [];
    const [from, to] = [before.get(change.held.id), after.get(change.now.id)];
    return from && to ? motionOf(change, from, to) : [];
  });
  return { ghosts, rings, motions };
}
