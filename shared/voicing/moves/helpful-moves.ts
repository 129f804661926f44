import type { Chord } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';
import { modelFor } from '#shared/voicing/muddiness/models';
import { indexOf } from '#shared/voicing/muddiness/scores';
import { moveTrial } from '#shared/voicing/moves/move-trial';
import type { HelpfulMove } from '#shared/voicing/moves/moves';
import { possibleMoves } from '#shared/voicing/moves/possible-moves';
import { differClearly } from '#shared/voicing/uncertainty';

/** As many as a reader weighs against each other. */
const MOVES_SHOWN = 8;

/**
 * The single moves that clear a chord most, each with the index before and after it.
 * @param chord 0 to 40 voices
 * @param settings what the sound depends on besides
 * @returns the most helpful first, at most eight; none whose difference is not clear
 */
export function helpfulMoves(chord: Chord, settings: SoundSettings): readonly HelpfulMove[] {
  const model = modelFor(settings.a4Hz);
  const { threshold } = model.constants;
  const trial = moveTrial(chord, settings, model);
  const before = indexOf(trial.before, threshold);
  return possibleMoves(chord.voices, settings.ensemble.bass)
    .map((move) => ({ ...move, before, after: indexOf(trial.after(move), threshold) }))
    .filter(({ after }) => after < before && differClearly(after, before))
    .sort((a, b) => a.after - b.after)
    .slice(0, MOVES_SHOWN);
}
