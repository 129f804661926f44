import type { NoteNaming } from '#shared/pitch/display';
import type { ChordAnalysis, PairShare } from '#shared/voicing/analysis';
import type { Register } from '#shared/voicing/registers';
import { findingsOf, type Finding } from '#shared/voicing/sentences';

/**
 * What clouds one register and why, in the words of {@link findingsOf}.
 * @param analysis of the chord
 * @param register the one that is asked about
 * @param pairs what makes it: see explainRegister
 * @returns largest part first; empty where the register is clear
 */
export function registerFindings(
  analysis: ChordAnalysis,
  register: Register,
  pairs: readonly PairShare[],
  naming: NoteNaming,
): readonly Finding[] {
  const { muddiness, limits } = analysis;
  const index = muddiness.registers.find((found) => found.register === register)?.index ?? 0;
  const told = findingsOf(
    { ...analysis, limits, pairs, muddiness: { ...muddiness, register, index } },
    naming,
  );
  return told.filter(({ share }) => share !== null);
}
