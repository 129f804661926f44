import type { Section } from '#shared/strings/sections';

/** What one can do to a voice: one move at a time. */
export type MoveKind = 'octaveUp' | 'octaveDown' | 'chordTone' | 'section' | 'leaveOut';

/** A single move of a voice, with the voices linked to it. */
export interface Move {
  readonly kind: MoveKind;
  /** The voices that move, the one that it is about first. */
  readonly ids: readonly string[];
  /** Where each of them goes; empty where they are left out. */
  readonly pitches: readonly string[];
  /** Who plays it then. */
  readonly section: Section;
}

/** A move and what it does to the chord's index. */
export interface HelpfulMove extends Move {
  readonly before: number;
  readonly after: number;
}
