import { useLocalStorage } from '@vueuse/core';
import { computed, ref, watch } from 'vue';
import { beginReveal, nextPart, shows, stepReveal } from '@/components/present/reveal';
import { usePlayback } from '@/composables/playback';

/** How much of a chord a class has been shown; a new chord begins anew. */
export function useReveal(chordId: () => string) {
  const playback = usePlayback();
  const stepwise = useLocalStorage('siltline.projector.stepwise', false);
  const reveal = ref(beginReveal(stepwise.value));
  const next = computed(() => nextPart(reveal.value));

  watch([chordId, stepwise], () => {
    playback.stop();
    reveal.value = beginReveal(stepwise.value);
  });

  function uncover(): void {
    reveal.value = stepReveal(reveal.value, 1);
    if (reveal.value.stepwise && reveal.value.upTo === 'sound') void playback.strike();
  }

  /** What was heard is not unheard, but nothing sounds on while it is covered. */
  function cover(): void {
    reveal.value = stepReveal(reveal.value, -1);
    if (!shows(reveal.value, 'sound')) playback.stop();
  }

  /** A chord that is still to be guessed from its notes is not heard: playing it uncovers its sound. */
  function sound(play: () => Promise<void>): void {
    if (!shows(reveal.value, 'sound')) uncover();
    else void play();
  }

  const mayCover = computed(() => reveal.value.stepwise && reveal.value.upTo !== 'notes');
  const toggle = (): void => void (stepwise.value = !stepwise.value);
  return { reveal, next, mayCover, uncover, cover, sound, toggle };
}
