import { createGlobalState, useEventListener } from '@vueuse/core';
import { readonly, ref, shallowReadonly, watch, type Ref } from 'vue';
import { sameListening, toggled, WHOLE_CHORD, type Listening, type Mix } from '@/audio/listening';
import { loadSoundEngine } from '@/audio/load-engine';
import { buildSchedule, progressionSchedule, strikeSchedule, type TimedSound } from '@/audio/schedule';
import type { SoundEngine } from '@/audio/sound-engine';
import { boundedVolume, QUIET_START } from '@/audio/volume';
import { usePlaybackChoice, type PlaybackMaterial } from '@/composables/playback-choice';
import { useLazyEngine, type LoadEngine, type PlaybackStatus } from '@/composables/playback-engine';
import { usePlaybackSigns, type PlaybackMode } from '@/composables/playback-signs';
import type { Section } from '#shared/strings/sections';
import type { Decibels } from '#shared/units';

export interface Playback {
  readonly status: Readonly<Ref<PlaybackStatus>>;
  readonly mode: Readonly<Ref<PlaybackMode>>;
  readonly listening: Readonly<Ref<Listening>>;
  readonly mix: Readonly<Ref<Mix>>;
  readonly volume: Readonly<Ref<Decibels>>;
  /** How much of the level meter is filled, 0 … 1. */
  readonly level: Readonly<Ref<number>>;
  /** The chord of the progression that sounds. */
  readonly playingChordId: Readonly<Ref<string | null>>;
  /** Says what there is to hear; a held chord follows it. */
  bring(material: PlaybackMaterial): void;
  strike(): Promise<void>;
  hold(): Promise<void>;
  build(): Promise<void>;
  playProgression(): Promise<void>;
  /** Holds a part of the chord, or the whole again; the same part once more ends it. */
  hear(part: Listening): Promise<void>;
  toggle(part: keyof Mix, section: Section): void;
  setVolume(volume: Decibels): void;
  stop(): void;
  /** The panic key: everything ends at once. */
  silence(): void;
}

/** A browser may put the sound of a hidden tab to sleep: what was sounding goes on when the tab comes back. */
function useWaking(sounding: () => SoundEngine | null): void {
  useEventListener(document, 'visibilitychange', () => {
    if (document.visibilityState === 'visible') void sounding()?.wake();
  });
}

/** Makes playback over an engine that is fetched when it is first needed. */
export function createPlayback(load: LoadEngine): Playback {
  const volume = ref<Decibels>(QUIET_START);
  const { material, listening, mix, heard, sections, loudest } = usePlaybackChoice();
  const { engine, status, order, withdraw } = useLazyEngine(load, volume);
  const { mode, level, playingChordId, show } = usePlaybackSigns(engine);

  let tempoBpm = material.value.tempoBpm;

  async function hold(part: Listening): Promise<void> {
    listening.value = part;
    if (await order((to) => to.hold(heard.value, loudest()))) show('hold');
  }

  async function play(begun: PlaybackMode, schedule: readonly TimedSound[]): Promise<void> {
    listening.value = WHOLE_CHORD;
    if (await order((to) => to.play(schedule, loudest()))) show(begun);
  }

  /** A tempo is kept to the end, so that changing it makes nobody lose the beat. */
  async function playProgression(): Promise<void> {
    tempoBpm = material.value.tempoBpm;
    await play('progression', progressionSchedule(material.value.progression, tempoBpm));
  }

  function end(how: 'stop' | 'silence'): void {
    withdraw();
    engine.value?.[how]();
    listening.value = WHOLE_CHORD;
    show('silent');
  }

  async function hear(part: Listening): Promise<void> {
    if (mode.value === 'hold' && sameListening(part, listening.value)) end('stop');
    else await hold(part);
  }

  function setVolume(wanted: Decibels): void {
    volume.value = boundedVolume(wanted);
    engine.value?.setVolume(volume.value);
  }

  watch(heard, () => {
    if (mode.value === 'hold') void hold(listening.value);
  });
  watch(material, ({ progression }) => {
    if (mode.value !== 'progression') return;
    engine.value?.revise(progressionSchedule(progression, tempoBpm), loudest());
  });
  watch([sections, engine], () => engine.value?.setSections(sections.value));
  useWaking(() => (mode.value === 'silent' ? null : engine.value));

  const signs = { status, mode: readonly(mode), level: readonly(level), playingChordId };
  return {
    ...signs,
    listening: shallowReadonly(listening),
    mix: shallowReadonly(mix),
    volume: readonly(volume),
    bring: (brought) => void (material.value = brought),
    strike: () => play('strike', strikeSchedule(material.value.sounds)),
    hold: () => hold(WHOLE_CHORD),
    build: () => play('build', buildSchedule(material.value.sounds)),
    playProgression,
    hear,
    toggle: (part, section) => void (mix.value = toggled(mix.value, part, section)),
    setVolume,
    stop: () => end('stop'),
    silence: () => end('silence'),
  };
}

/** Playback of the page: one for all, since a page has one pair of loudspeakers. */
export const usePlayback = createGlobalState(() => createPlayback(loadSoundEngine));
