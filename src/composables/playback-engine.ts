import { shallowRef, type Ref, type ShallowRef } from 'vue';
import type { SoundEngine } from '@/audio/sound-engine';
import type { Decibels } from '#shared/units';

export type PlaybackStatus = 'idle' | 'loading' | 'ready' | 'error';
export type LoadEngine = (volume: Decibels, room: boolean) => Promise<SoundEngine>;

interface LazyEngine {
  readonly engine: Readonly<ShallowRef<SoundEngine | null>>;
  readonly status: Readonly<Ref<PlaybackStatus>>;
  /** Gives an order to the engine, unless a later order has come before the engine was there. */
  order(give: (engine: SoundEngine) => Promise<void>): Promise<boolean>;
  /** Lets an order that still waits fall. */
  withdraw(): void;
}

/** The engine is fetched with the first order; where that fails the next order tries again. */
export function useLazyEngine(
  load: LoadEngine,
  volume: Readonly<Ref<Decibels>>,
  room: Readonly<Ref<boolean>>,
): LazyEngine {
  const engine = shallowRef<SoundEngine | null>(null);
  const status = shallowRef<PlaybackStatus>('idle');
  let loading: Promise<SoundEngine | null> | null = null;
  let orders = 0;

  async function fetchEngine(): Promise<SoundEngine | null> {
    status.value = 'loading';
    try {
      const loaded = await load(volume.value, room.value);
      loaded.setVolume(volume.value);
      loaded.setRoom(room.value);
      engine.value = loaded;
      status.value = 'ready';
    } catch {
      status.value = 'error';
      loading = null;
    }
    return engine.value;
  }

  async function order(give: (engine: SoundEngine) => Promise<void>): Promise<boolean> {
    orders += 1;
    const mine = orders;
    loading ??= fetchEngine();
    const there = await loading;
    if (!there || mine !== orders) return false;
    try {
      await give(there);
    } catch {
      status.value = 'error';
      return false;
    }
    status.value = 'ready';
    return mine === orders;
  }

  return { engine, status, order, withdraw: () => void (orders += 1) };
}
