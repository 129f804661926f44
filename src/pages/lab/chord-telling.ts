import { computed, shallowRef } from 'vue';
import type { NoteNaming } from '#shared/pitch/display';
import type { Chord } from '#shared/study/study.document';
import { explainRegister, type ChordAnalysis } from '#shared/voicing/analysis';
import { balanceOf } from '#shared/voicing/balance';
import { balanceSentences } from '#shared/voicing/balance.sentences';
import { characterOf } from '#shared/voicing/character';
import { characterFigures } from '#shared/voicing/character.sentences';
import { registerFindings } from '#shared/voicing/register.sentences';
import type { Register } from '#shared/voicing/registers';
import { findingsOf } from '#shared/voicing/sentences';
import type { useBenchStore } from '@/stores/bench.store';

/** What is said of the selected chord under the bench, of the whole or of one register. */
export function useChordTelling(
  bench: ReturnType<typeof useBenchStore>,
  chord: () => Chord,
  analysis: () => ChordAnalysis,
  naming: () => NoteNaming,
) {
  /** The register that is asked about. */
  const register = shallowRef<Register | null>(null);
  const findings = computed(() => {
    if (!register.value) return findingsOf(analysis(), naming());
    const pairs = explainRegister(chord(), bench.study, register.value);
    return registerFindings(analysis(), register.value, pairs, naming());
  });
  const character = computed(() => characterOf(analysis().voices, bench.study.a4Hz));
  const figures = computed(() =>
    characterFigures(character.value, analysis().limits.length, bench.study.key, naming()),
  );
  const balance = computed(() => balanceSentences(balanceOf(analysis().voices), analysis().voices, naming()));
  function askRegister(asked: Register | null): void {
    register.value = asked;
  }
  return { findings, figures, balance, register, askRegister };
}
