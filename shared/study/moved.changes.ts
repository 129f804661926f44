import type { Chord } from '#shared/study/study.document';
import { removeVoice } from '#shared/study/voices.changes';
import { movedVoices, type Move } from '#shared/voicing/moves/moves';

/**
 * @param move of voices of this chord
 * @returns the chord after the move, as it is kept: a double stop of which one note is left is none
 */
export function applyMove(chord: Chord, move: Move): Chord {
  if (move.kind === 'leaveOut') return move.ids.reduce(removeVoice, chord);
  return { ...chord, voices: [...movedVoices(chord.voices, move)] };
}
