import type { Chord } from '#shared/study/study.document';
import type { ChordAnalysis, SoundSettings } from '#shared/voicing/analysis';
import { analyseChord } from '#shared/voicing/analysis';
import { hearPartials } from '#shared/voicing/audibility';
import type { ChordBalance } from '#shared/voicing/balance';
import { balanceOf } from '#shared/voicing/balance';
import type { ChordCharacter } from '#shared/voicing/character';
import { characterOf } from '#shared/voicing/character';
import type { ChordDensity } from '#shared/voicing/density';
import { densityOfChord } from '#shared/voicing/density';
import { helpfulMoves } from '#shared/voicing/moves/helpful-moves';
import type { HelpfulMove } from '#shared/voicing/moves/moves';

/** Everything that the program says of one chord. */
export interface FullAnalysis extends ChordAnalysis {
  readonly density: ChordDensity;
  readonly balance: ChordBalance;
  readonly character: ChordCharacter;
  readonly moves: readonly HelpfulMove[];
}

/**
 * Judges a chord and says besides how densely it fills the registers, who is covered, what it is like as a whole,
 * and which single moves would clear it.
 * @param chord 0 to 40 voices
 * @param settings what the sound depends on besides
 * @example fullAnalysis(chord, settings).muddiness // the same as of analyseChord
 */
export function fullAnalysis(chord: Chord, settings: SoundSettings): FullAnalysis {
  const analysis = analyseChord(chord, settings);
  const heard = hearPartials(analysis.voices);
  return {
    ...analysis,
    density: densityOfChord(analysis.voices, settings.a4Hz, heard),
    balance: balanceOf(analysis.voices, heard),
    character: characterOf(analysis.voices, settings.a4Hz),
    moves: helpfulMoves(chord, settings, analysis),
  };
}
