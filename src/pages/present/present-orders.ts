import { useEventListener, useFullscreen, useLocalStorage } from '@vueuse/core';
import { computed } from 'vue';
import type { DraftDocument } from '#shared/study/draft';
import { presentOrder, type PresentOrder } from '@/components/present/present-keys';
import { usePlayback } from '@/composables/playback';
import { answersSpace } from '@/composables/playback-keys';
import { useReveal } from '@/pages/present/reveal-orders';

const STEP_DB = 3;
/** A key that is held down goes on with these, and with nothing else. */
const REPEATED: readonly PresentOrder[] = ['louder', 'quieter'];

interface Presented {
  readonly study: DraftDocument;
  readonly chordId: string;
}

/** What the projector does when it is told to, by a key, the mouse or a presenter's remote. */
export function usePresentOrders(
  presented: () => Presented,
  choose: (chordId: string) => Promise<void>,
  leave: () => Promise<void>,
) {
  const playback = usePlayback();
  const full = useFullscreen();
  const light = useLocalStorage('siltline.projector.light', false);
  const shown = useReveal(() => presented().chordId);
  const sounding = computed(() => playback.mode.value !== 'silent');

  function goBy(by: 1 | -1): void {
    const { study, chordId } = presented();
    const place = study.chords.findIndex(({ id }) => id === chordId);
    const chord = study.chords[place + by];
    if (chord) void choose(chord.id);
  }

  function reveal(): void {
    if (shown.next.value) shown.uncover();
  }

  const orders: Readonly<Record<PresentOrder, () => void>> = {
    'next-chord': () => goBy(1),
    'previous-chord': () => goBy(-1),
    reveal,
    cover: shown.cover,
    on: () => (shown.next.value ? shown.uncover() : goBy(1)),
    back: () => (shown.mayCover.value ? shown.cover() : goBy(-1)),
    strike: () => (sounding.value ? playback.stop() : shown.sound(playback.strike)),
    hold: () => (playback.mode.value === 'hold' ? playback.stop() : shown.sound(playback.hold)),
    build: () => shown.sound(playback.build),
    'full-screen': () => void full.toggle(),
    stepwise: shown.toggle,
    colours: () => void (light.value = !light.value),
    louder: () => playback.setVolume(playback.volume.value + STEP_DB),
    quieter: () => playback.setVolume(playback.volume.value - STEP_DB),
    leave: () => {
      playback.silence();
      void leave();
    },
  };

  /** The space bar uncovers what comes next; where all is shown it plays and stops, as on the bench. */
  function answer(event: KeyboardEvent): void {
    const asked = presentOrder(event);
    if (!asked || event.defaultPrevented) return;
    if (event.key === ' ' && answersSpace(event.target)) return;
    event.preventDefault();
    if (event.repeat && !REPEATED.includes(asked)) return;
    orders[event.key === ' ' && !shown.next.value ? 'strike' : asked]();
  }
  useEventListener(document, 'keydown', answer);

  const order = (asked: PresentOrder): void => orders[asked]();
  return { playback, reveal: shown.reveal, next: shown.next, sounding, light, full, order };
}
