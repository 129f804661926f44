import { computed, ref, type ShallowRef } from 'vue';
import { readLine, type LineContext } from '#shared/study/chord-line';
import { dealtText } from '#shared/study/harmony/harmony.sentences';
import type { Chord } from '#shared/study/study.document';
import { typingLineOf } from '#shared/study/typing-line.text';
import type { TypedVoice } from '#shared/study/typing-line';
import type { TypingFault } from '#shared/study/typing-line.words';
import { settledFaults, stretchesOf } from '@/components/bench/typing-text';

/** What the line tells the bench. */
export interface LineListener {
  readonly begin: () => void;
  readonly typed: (voices: readonly TypedVoice[]) => void;
  readonly end: () => void;
  readonly cancel: () => void;
}

/** The chord as one line of text, which can be typed over. Notes are given on at once; a symbol is dealt at the end. */
export function useTypedLine(
  chord: () => Chord,
  context: () => LineContext,
  field: Readonly<ShallowRef<HTMLInputElement | null>>,
  listener: LineListener,
) {
  /** What is being typed; null while the line shows the chord. */
  const typing = ref<string | null>(null);
  const caret = ref(0);
  const finished = ref(false);
  const scroll = ref(0);

  const text = computed(() => typing.value ?? typingLineOf(chord(), context().naming));
  const read = computed(() => readLine(text.value, context()));
  const faults = computed(() => {
    if (typing.value === null) return [];
    return finished.value ? read.value.faults : settledFaults(read.value.faults, text.value, caret.value);
  });
  const stretches = computed(() => stretchesOf(text.value, faults.value));
  /** How a symbol is understood, before it is dealt. */
  const understood = computed(() => {
    const { dealt } = read.value;
    return typing.value === null || !dealt ? null : dealtText(dealt, context().naming);
  });

  function follow(): void {
    caret.value = field.value?.selectionStart ?? 0;
    scroll.value = field.value?.scrollLeft ?? 0;
  }

  function type(): void {
    listener.begin();
    typing.value = field.value?.value ?? '';
    finished.value = false;
    follow();
    const { voices, faults: found, dealt } = read.value;
    if (found.length === 0 && voices.length > 0 && !dealt) listener.typed(voices);
  }

  /** Takes the line, or keeps it as it is with its faults and the chord as it was. */
  function finish(): void {
    if (typing.value === null || finished.value) return;
    finished.value = true;
    if (read.value.faults.length > 0) return listener.cancel();
    listener.typed(read.value.voices);
    listener.end();
    typing.value = null;
  }

  /** @returns whether there was anything to give up */
  function giveUp(): boolean {
    if (typing.value === null) return false;
    listener.cancel();
    typing.value = null;
    return true;
  }

  function goTo({ start, end }: TypingFault): void {
    field.value?.focus();
    field.value?.setSelectionRange(start, end);
  }

  const shown = { text, faults, stretches, understood, finished, scroll };
  return { ...shown, follow, type, finish, giveUp, goTo };
}
