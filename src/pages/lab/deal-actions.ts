import { ref } from 'vue';
import { readLine, type LineContext } from '#shared/study/chord-line';
import { dealtText } from '#shared/study/harmony/harmony.sentences';
import type { Chord } from '#shared/study/study.document';
import { notice } from '@/composables/notices';
import type { useTypingActions } from '@/pages/lab/bench-actions';

/** The dealing of a symbol or numeral from its panel: one step, which undo takes back. */
export function useDealActions(
  chord: () => Chord,
  context: () => Omit<LineContext, 'kept'>,
  typing: ReturnType<typeof useTypingActions>,
) {
  const symbol = ref('');
  const trouble = ref<string | null>(null);

  function deal(typed: string): void {
    symbol.value = typed;
    const kept = chord().voices.filter(({ locked }) => locked);
    const { voices, faults, dealt } = readLine(typed, { ...context(), kept });
    const [fault] = faults;
    trouble.value =
      fault?.message ?? (dealt ? null : 'Write one chord symbol, such as Bbm7, or a numeral, such as V6/5.');
    if (!dealt) return;
    typing.begin();
    typing.typed(voices);
    typing.end();
    notice(dealtText(dealt, context().naming));
  }

  return { symbol, trouble, deal };
}
