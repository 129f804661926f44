import { createGlobalState, useEventListener, useLocalStorage, watchDebounced } from '@vueuse/core';
import { computed, readonly, ref, shallowReadonly, watch } from 'vue';
import { toggled, WHOLE_CHORD } from '@/audio/listening';
import { loadSoundEngine } from '@/audio/load-engine';
import { buildSchedule, strikeSchedule } from '@/audio/schedule';
import type { SoundEngine } from '@/audio/sound-engine';
import { boundedVolume, QUIET_START } from '@/audio/volume';
import { usePlaybackChoice } from '@/composables/playback-choice';
import { usePlaybackComparison } from '@/composables/playback-comparison';
import { useLazyEngine, type LoadEngine } from '@/composables/playback-engine';
import type { Playback } from '@/composables/playback-interface';
import { usePlaybackOrders } from '@/composables/playback-orders';
import { usePlaybackSigns } from '@/composables/playback-signs';
import type { Decibels } from '#shared/units';

/** Once a chord has stood still for so long, its sound is made ready. */
const REST_MILLISECONDS = 250;

/** A browser may put the sound of a hidden tab to sleep: what was sounding goes on when the tab comes back. */
function useWaking(sounding: () => SoundEngine | null): void {
  useEventListener(document, 'visibilitychange', () => {
    if (document.visibilityState === 'visible') void sounding()?.wake();
  });
}

/** Makes playback over an engine that is fetched when it is first needed. */
export function createPlayback(load: LoadEngine): Playback {
  const volume = ref<Decibels>(QUIET_START);
  const room = useLocalStorage('siltline.playback.room', true);
  const choice = usePlaybackChoice();
  const { material, listening, mix, heard, sections, lifted, octave } = choice;
  const lazy = useLazyEngine(load, volume, room);
  const { engine, status } = lazy;
  const signs = usePlaybackSigns(engine);
  const { mode, level, playingChordId, playingPartial } = signs;
  const comparison = usePlaybackComparison();
  const orders = usePlaybackOrders({ choice, lazy, signs, comparison });
  const { sustain, play, playProgression, playPartials, hear, end } = orders;

  watch([heard, octave], orders.follow);
  watch(choice.progression, orders.revise);
  watch([sections, engine], () => engine.value?.setSections(sections.value));
  watch(room, (on) => engine.value?.setRoom(on));
  watchDebounced([heard, engine], () => engine.value?.makeReady(heard.value), {
    debounce: REST_MILLISECONDS,
  });
  useWaking(() => (mode.value === 'silent' ? null : engine.value));

  const shown = { level, playingChordId, playingPartial, status, mode: readonly(mode) };
  return {
    ...shown,
    listening: shallowReadonly(listening),
    heard: computed(() => (mode.value === 'listen' ? listening.value : null)),
    mix: shallowReadonly(mix),
    volume: readonly(volume),
    side: readonly(comparison.side),
    room: readonly(room),
    octave: readonly(octave),
    bring: (brought) => void (material.value = brought),
    strike: () => play('strike', strikeSchedule(lifted(material.value.sounds))),
    hold: () => sustain(WHOLE_CHORD, 'hold'),
    build: () => play('build', buildSchedule(lifted(material.value.sounds))),
    playProgression,
    playPartials,
    hear,
    async compareAB(a, b) {
      comparison.bring(a, b);
      await orders.compare();
    },
    switchTo(side) {
      comparison.side.value = side;
      if (mode.value === 'compare') engine.value?.switchTo(side);
    },
    playApart: (schedule, scale) => play('apart', schedule, scale),
    toggle: (part, section) => void (mix.value = toggled(mix.value, part, section)),
    setVolume(wanted) {
      volume.value = boundedVolume(wanted);
      engine.value?.setVolume(volume.value);
    },
    setRoom: (on) => void (room.value = on),
    setOctave: (higher) => void (octave.value = higher),
    stop: () => end('stop'),
    silence: () => end('silence'),
  };
}

/** Playback of the page: one for all, since a page has one pair of loudspeakers. */
export const usePlayback = createGlobalState(() => createPlayback(loadSoundEngine));
