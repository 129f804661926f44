import type { Chord } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';
import { analyseChord } from '#shared/voicing/analysis';
import { helpfulMoves } from '#shared/voicing/moves/helpful-moves';
import type { HelpfulMove } from '#shared/voicing/moves/moves';
import { movedVoices } from '#shared/voicing/moves/moves';
import type { Register } from '#shared/voicing/registers';
import { uncertaintyOf } from '#shared/voicing/uncertainty';

/** A move with what it does to the register that is cloudiest before it. */
export interface WeighedMove extends HelpfulMove {
  /** Half the width of the band in which the chord's index lies after the move, points. */
  readonly uncertainty: number;
  readonly register: {
    readonly register: Register;
    readonly before: number;
    readonly after: number;
  };
}

/**
 * The single moves that clear a chord most, each with what it does to the chord and to its cloudiest register.
 * @param chord 0 to 40 voices
 * @param settings what the sound depends on besides
 * @returns the most helpful first; none whose difference is not clear
 * @throws RangeError where a pitch or the tonic is not a note
 */
export function weighedMoves(chord: Chord, settings: SoundSettings): readonly WeighedMove[] {
  const analysis = analyseChord(chord, settings);
  const { register } = analysis.muddiness;
  if (register === null) return [];
  const indexIn = (registers: typeof analysis.muddiness.registers): number =>
    registers.find((found) => found.register === register)?.index ?? 0;
  const before = indexIn(analysis.muddiness.registers);
  return helpfulMoves(chord, settings, analysis).map((move) => {
    const moved = { ...chord, voices: [...movedVoices(chord.voices, move)] };
    const after = indexIn(analyseChord(moved, settings).muddiness.registers);
    return { ...move, uncertainty: uncertaintyOf(move.after), register: { register, before, after } };
  });
}
