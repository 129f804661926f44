import { useRafFn } from '@vueuse/core';
import { computed, ref, type ComputedRef, type Ref, type ShallowRef } from 'vue';
import { partialOfKey, type SoundingPartial } from '@/audio/schedule';
import type { SoundEngine } from '@/audio/sound-engine';
import { meterFill } from '@/audio/volume';

/** What sounds: `listen` is a part of the chord heard for a while, `apart` something that is not of the study. */
export type PlaybackMode =
  'silent' | 'strike' | 'hold' | 'listen' | 'build' | 'partials' | 'progression' | 'compare' | 'apart';

interface PlaybackSigns {
  readonly mode: Ref<PlaybackMode>;
  /** How much of the level meter is filled, 0 … 1. */
  readonly level: Ref<number>;
  readonly playingChordId: ComputedRef<string | null>;
  readonly playingPartial: ComputedRef<SoundingPartial | null>;
  /** Says what has begun, or that it has been ended. */
  show(mode: PlaybackMode): void;
}

/** Follows the engine from frame to frame while something sounds, and rests otherwise. */
export function usePlaybackSigns(engine: Readonly<ShallowRef<SoundEngine | null>>): PlaybackSigns {
  const mode = ref<PlaybackMode>('silent');
  const level = ref(0);
  const playhead = ref<string | null>(null);
  const playingChordId = computed(() => (mode.value === 'progression' ? playhead.value : null));
  const playingPartial = computed(() =>
    mode.value === 'partials' && playhead.value !== null ? partialOfKey(playhead.value) : null,
  );

  function follow(): void {
    if (engine.value?.state === 'silent') mode.value = 'silent';
    level.value = meterFill(engine.value?.peak() ?? -Infinity);
    playhead.value = engine.value?.playhead() ?? null;
    if (mode.value === 'silent' && level.value === 0) frames.pause();
  }
  const frames = useRafFn(follow, { immediate: false });

  function show(begun: PlaybackMode): void {
    mode.value = begun;
    if (begun === 'silent') playhead.value = null;
    frames.resume();
  }

  return { mode, level, playingChordId, playingPartial, show };
}
