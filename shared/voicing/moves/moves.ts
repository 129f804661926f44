import { midiOfName } from '#shared/pitch/names';
import type { Section } from '#shared/strings/sections';
import type { Voice } from '#shared/study/study.document';

/** What one can do to a voice: one move at a time. */
export const MOVE_KINDS = ['octaveUp', 'octaveDown', 'chordTone', 'section', 'leaveOut'] as const;
export type MoveKind = (typeof MOVE_KINDS)[number];

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
  /** A pitch, as it stood, whose note of the scale nobody plays any more; null where every chord tone stays. */
  readonly lost: string | null;
}

const OCTAVE = 12;

function pitchClass(pitch: string): number {
  return midiOfName(pitch) % OCTAVE;
}

/**
 * @returns the first pitch whose note of the scale nobody plays after the move, or null
 * @example lostBy(voices, move) // 'F2', where it was the only F
 */
export function lostBy(voices: readonly Voice[], move: Move): string | null {
  const kept = new Set(movedVoices(voices, move).map(({ pitch }) => pitchClass(pitch)));
  return voices.find(({ pitch }) => !kept.has(pitchClass(pitch)))?.pitch ?? null;
}

/**
 * The voices of a chord after a move.
 * @example movedVoices(voices, { kind: 'leaveOut', ids: ['a'], pitches: [], section }) // all but a
 */
export function movedVoices(
  voices: readonly Voice[],
  { kind, ids, pitches, section }: Move,
): readonly Voice[] {
  if (kind === 'leaveOut') return voices.filter(({ id }) => !ids.includes(id));
  return voices.map((voice) => {
    const place = ids.indexOf(voice.id);
    if (place < 0) return voice;
    const pitch = pitches[place] ?? voice.pitch;
    return kind === 'section' ? { ...voice, pitch, section, string: null } : { ...voice, pitch };
  });
}
