import type { SystemPlan } from '#shared/notation/system-plan';
import type { NoteValue } from '#shared/notation/note-values';
import type { StaffEvent, StaffSketch, StaffText } from '@/engraving/staff-sketch';
import { hasStem } from '@/engraving/note-shapes';
import { accidentalRoom } from '@/engraving/room-before';
import { LINE, staffExtents } from '@/engraving/staff-extents';
import { staffPlaces, type StaffPlaces } from '@/engraving/staff-places';

/** One chord on its staves, ready to be drawn. */
export interface SystemSketch extends StaffPlaces {
  readonly staves: readonly StaffSketch[];
}

export interface SystemRoom {
  /** Pixels that the staves may take. */
  readonly width: number;
  readonly height: number;
  /** Size of the words, in pixels. */
  readonly textSize: number;
  /** Where notes may begin, in units of drawing. */
  readonly beginning: number;
  readonly largest: number;
}

/** From the left edge of one head to that of the head tied to it. */
const TIED_APART = 44;
/** From the left edge of the last head to the end of the staff. */
const AFTER_HEAD = 30;
const BEFORE_ACCIDENTALS = 10;
/** More than two tied notes have no room beside one chord: the rest is hinted at by an open tie. */
const MOST_TIED = 2;

function eventsOf(
  staff: SystemPlan['staves'][number],
  values: readonly NoteValue[],
  width: number,
): readonly StaffEvent[] {
  const shown = values.slice(0, MOST_TIED);
  return shown.map((value, index) => {
    const first = index === 0;
    const { chord } = staff;
    return {
      x: width - AFTER_HEAD - (shown.length - 1 - index) * TIED_APART,
      value,
      chord: first || !chord ? chord : { ...chord, notes: chord.notes.map(bare) },
      clef: staff.clef,
      newClef: false,
      tiedFrom: !first,
      tiedTo: index < values.length - 1,
      words: [],
      dynamics: [],
    };
  });
}

function bare<Note extends { readonly accidental: number | null }>(note: Note): Note {
  return { ...note, accidental: null };
}

/** Words and dynamics stand with the last head, whose right edge they end at: what is right of it stays free. */
function withWords(
  events: readonly StaffEvent[],
  staff: SystemPlan['staves'][number],
): readonly StaffEvent[] {
  const { words, chord } = staff;
  return events.map((event, index) =>
    index < events.length - 1 ? event : { ...event, words, dynamics: chord?.dynamics ?? [] },
  );
}

/**
 * Lays one chord out on its five staves: heads over each other, words up to their right edge, as large as the
 * room allows.
 * @param plan of the chord
 * @param room of the staves
 * @returns the staves, their places and their scale
 */
export function systemSketch(plan: SystemPlan, room: SystemRoom): SystemSketch {
  const before = Math.max(...plan.staves.map(({ chord }) => accidentalRoom(chord)));
  const tied = (Math.min(plan.values.length, MOST_TIED) - 1) * TIED_APART;
  const needed = room.beginning + BEFORE_ACCIDENTALS + before + tied + AFTER_HEAD;
  const largest = Math.min(room.largest, room.width / needed);
  const stemmed = plan.values.some(hasStem);
  const placesAt = (scale: number): StaffPlaces => {
    const line = (room.textSize / scale) * LINE;
    const extents = plan.staves.map((staff) =>
      staffExtents([{ ...staff, dynamics: staff.chord?.dynamics ?? [] }], stemmed, line),
    );
    return staffPlaces(extents, room.height, largest);
  };
  // Words keep their size on the screen, so that in smaller staves they take more of the staff's own room.
  const { scale, tops, height } = placesAt(placesAt(largest).scale);
  const width = room.width / scale;
  const text: StaffText = { size: room.textSize / scale, anchor: 'end' };
  const staves = plan.staves.map((staff) => ({
    ...{
      width,
      clef: staff.clef,
      signature: staff.signature,
      opens: true,
      metre: null,
      clefAfter: null,
      text,
    },
    events: withWords(eventsOf(staff, plan.values, width), staff),
  }));
  return { scale, tops, height, staves };
}
