import type { NoteValue } from '#shared/notation/note-values';
import type { StaffChord } from '#shared/notation/staff-chord';
import type { Clef } from '#shared/strings/clefs';
import type { Dynamic } from '#shared/study/study.document';

/** One written length on a staff. */
export interface StaffEvent {
  /** Left edge of its heads. */
  readonly x: number;
  readonly value: NoteValue;
  /** Null is a rest. */
  readonly chord: StaffChord | null;
  readonly clef: Clef;
  /** The clef changes here. */
  readonly newClef: boolean;
  readonly tiedFrom: boolean;
  readonly tiedTo: boolean;
  /** Over the staff, and under it. */
  readonly words: readonly string[];
  readonly dynamics: readonly Dynamic[];
}

/** A stretch of one staff. */
export interface StaffSketch {
  readonly width: number;
  readonly clef: Clef;
  readonly signature: number;
  /** The clef and signature are drawn at its beginning. */
  readonly opens: boolean;
  /** Drawn after the signature; null where it is not. */
  readonly metre: { readonly beats: number; readonly unit: number } | null;
  readonly events: readonly StaffEvent[];
  /** A new clef before its bar line. */
  readonly clefAfter: Clef | null;
  readonly text: StaffText;
}

/** How the words stand to their notes: from the left edge of the heads on, or up to their right edge. */
export interface StaffText {
  readonly size: number;
  readonly anchor: 'start' | 'end';
}

export interface DrawnHead {
  readonly voiceId: string;
  readonly left: number;
  readonly right: number;
  readonly y: number;
}

export interface DrawnStaff {
  readonly element: SVGGElement;
  /** Of each event, from the bottom. */
  readonly heads: readonly (readonly DrawnHead[])[];
}
