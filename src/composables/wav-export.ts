import { shallowRef } from 'vue';
import { amplitudeOf } from '@/audio/levels';
import { endOf, type TimedSound } from '@/audio/schedule';
import { peakGain, wavOf, type BitDepth } from '@/audio/wav';
import type { Section } from '#shared/strings/sections';
import type { Decibels } from '#shared/units';

export interface WavOrder {
  readonly schedule: readonly TimedSound[];
  readonly loudest: Decibels;
  readonly sections: readonly Section[];
  readonly room: boolean;
  readonly bits: BitDepth;
}

export interface WavFile {
  readonly blob: Blob;
  /** What brought its peak under full scale. */
  readonly gain: Decibels;
}

/** Sampled so often; longer than this is not made, for the browser must hold it all. */
const SAMPLE_RATE = 48000;
export const LONGEST_MINUTES = 15;
const SECONDS_PER_MINUTE = 60;

/** @returns whether it is short enough to be made */
export function mayBeMade(schedule: readonly TimedSound[]): boolean {
  return endOf(schedule) <= LONGEST_MINUTES * SECONDS_PER_MINUTE;
}

/** Makes a WAV file faster than one could hear it, with its progress and a way to stop it. */
export function useWavExport() {
  const status = shallowRef<'idle' | 'making' | 'ready' | 'error'>('idle');
  const done = shallowRef(0);
  const file = shallowRef<WavFile | null>(null);
  let stopping: AbortController | null = null;

  async function render({ schedule, loudest, sections, room, bits }: WavOrder, signal: AbortSignal) {
    const { renderSchedule } = await import('@/audio/render');
    const onProgress = (part: number) => (done.value = part);
    const settings = { loudest, sections, room, sampleRate: SAMPLE_RATE, onProgress, signal };
    const sound = await renderSchedule(schedule, settings);
    const gain = peakGain(sound);
    const factor = amplitudeOf(gain);
    const scaled = (samples: Float32Array<ArrayBuffer>) => samples.map((sample) => sample * factor);
    const bytes = wavOf({ ...sound, left: scaled(sound.left), right: scaled(sound.right) }, bits);
    return { blob: new Blob([bytes], { type: 'audio/wav' }), gain };
  }

  async function make(order: WavOrder): Promise<void> {
    stop();
    const mine = new AbortController();
    stopping = mine;
    [status.value, done.value, file.value] = ['making', 0, null];
    try {
      const made = await render(order, mine.signal);
      if (!mine.signal.aborted) [file.value, status.value] = [made, 'ready'];
    } catch {
      if (!mine.signal.aborted) status.value = 'error';
    }
  }

  function stop(): void {
    stopping?.abort();
    [status.value, file.value] = ['idle', null];
  }

  return { status, done, file, make, stop };
}
