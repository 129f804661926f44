import { useRafFn } from '@vueuse/core';
import { ref, type Ref, type ShallowRef } from 'vue';
import type { SoundEngine } from '@/audio/sound-engine';
import { meterFill } from '@/audio/volume';

export type PlaybackMode = 'silent' | 'strike' | 'hold' | 'build' | 'progression';

interface PlaybackSigns {
  readonly mode: Ref<PlaybackMode>;
  /** How much of the level meter is filled, 0 … 1. */
  readonly level: Ref<number>;
  readonly playingChordId: Ref<string | null>;
  /** Says what has begun, or that it has been ended. */
  show(mode: PlaybackMode): void;
}

/** Follows the engine from frame to frame while something sounds, and rests otherwise. */
export function usePlaybackSigns(engine: Readonly<ShallowRef<SoundEngine | null>>): PlaybackSigns {
  const mode = ref<PlaybackMode>('silent');
  const level = ref(0);
  const playingChordId = ref<string | null>(null);

  function follow(): void {
    if (engine.value?.state === 'silent') mode.value = 'silent';
    level.value = meterFill(engine.value?.peak() ?? -Infinity);
    playingChordId.value = mode.value === 'progression' ? (engine.value?.playhead() ?? null) : null;
    if (mode.value === 'silent' && level.value === 0) frames.pause();
  }
  const frames = useRafFn(follow, { immediate: false });

  function show(begun: PlaybackMode): void {
    mode.value = begun;
    if (begun === 'silent') playingChordId.value = null;
    frames.resume();
  }

  return { mode, level, playingChordId, show };
}
