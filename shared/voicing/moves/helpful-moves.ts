import type { Chord } from '#shared/study/study.document';
import type { ChordAnalysis, PairShare, SoundSettings } from '#shared/voicing/analysis';
import { analyseChord } from '#shared/voicing/analysis';
import { moveTrial } from '#shared/voicing/moves/move-trial';
import { lostBy, type HelpfulMove } from '#shared/voicing/moves/moves';
import { possibleMoves } from '#shared/voicing/moves/possible-moves';
import { modelFor } from '#shared/voicing/muddiness/models';
import { densityOfIndex, indexOf } from '#shared/voicing/muddiness/scores';
import { clearlyBelow, differClearly } from '#shared/voicing/uncertainty';

/** As many as a reader weighs against each other. */
const MOVES_SHOWN = 8;
/**
 * A voice with less than this share of the cloudiest place cannot clear it: without it ρ would fall by less than
 * the uncertainty.
 */
const LEAST_SHARE = 0.05;

/**
 * The single moves that clear a chord most, each with the index before and after it.
 * @param chord 0 to 40 voices
 * @param settings what the sound depends on besides
 * @param analysis of this chord, where it is at hand
 * @returns at most eight, none whose difference is not clear: first those that keep every chord tone, then those
 *   that lose one, the most helpful first among each
 * @example helpfulMoves(chordOfOneVoice, settings) // []
 */
export function helpfulMoves(
  chord: Chord,
  settings: SoundSettings,
  analysis: Pick<ChordAnalysis, 'muddiness' | 'pairs'> = analyseChord(chord, settings),
): readonly HelpfulMove[] {
  const before = analysis.muddiness.index;
  if (!differClearly(before, 0)) return [];
  const model = modelFor(settings.a4Hz);
  const { threshold } = model.constants;
  const shares = voiceShares(analysis.pairs);
  const useless = densityOfIndex(clearlyBelow(before), threshold);
  const trial = moveTrial(chord, settings, model);
  const asked = ({ id }: { readonly id: string }) => (shares.get(id) ?? 0) >= LEAST_SHARE;
  return possibleMoves(chord.voices, settings.ensemble.bass, asked)
    .map((move) => ({ ...move, before, after: indexOf(trial.after(move, useless), threshold) }))
    .filter(({ after }) => after < before && differClearly(after, before))
    .map((move) => ({ ...move, lost: lostBy(chord.voices, move) }))
    .sort((a, b) => Number(a.lost !== null) - Number(b.lost !== null) || a.after - b.after)
    .slice(0, MOVES_SHOWN);
}

/** How much of the cloudiest place each voice has a part in. */
function voiceShares(pairs: readonly PairShare[]): ReadonlyMap<string, number> {
  const shares = new Map<string, number>();
  for (const { lowerId, upperId, share } of pairs) {
    for (const id of [lowerId, upperId]) shares.set(id, (shares.get(id) ?? 0) + share);
  }
  return shares;
}
