import { OfflineContext } from 'tone';
import { envelopeOf } from '@/audio/envelope';
import { scaleFor } from '@/audio/levels';
import { prepareLine } from '@/audio/line';
import { buildMaster } from '@/audio/master';
import { ROOM_SECONDS } from '@/audio/room';
import { endOf, type TimedSound } from '@/audio/schedule';
import { createWaveStore } from '@/audio/wave-store';
import type { Section } from '#shared/strings/sections';
import type { Decibels, Hertz } from '#shared/units';

/** Sound made by calculation, sample for sample. */
export interface RenderedSound {
  readonly sampleRate: Hertz;
  readonly left: Float32Array<ArrayBuffer>;
  readonly right: Float32Array<ArrayBuffer>;
}

export interface RenderSettings {
  /** Level of the loudest chord of the common scale. */
  readonly loudest: Decibels;
  readonly sections: readonly Section[];
  readonly room: boolean;
  readonly sampleRate: Hertz;
  /** Told after each chord how much of the whole is done, 0 … 1. */
  readonly onProgress?: (done: number) => void;
  /** Stops it between two chords. */
  readonly signal?: AbortSignal;
}

/** The longest release and what the oscillators go on after it. */
const END_SECONDS = 0.25;

/** The same way of the sound as the live one, but for the limiter, over one entry of a schedule. */
async function renderEntry({ seconds, sounds }: TimedSound, settings: RenderSettings): Promise<AudioBuffer> {
  const { loudest, sections, room, sampleRate } = settings;
  const duration = seconds + END_SECONDS + (room ? ROOM_SECONDS : 0);
  const context = new OfflineContext(2, duration, sampleRate);
  const master = buildMaster(context, { volume: 0, room, limited: false });
  const waves = createWaveStore(context);
  master.setScale(scaleFor(loudest), 0, false);
  for (const sound of sounds.filter(({ section }) => sections.includes(section))) {
    const line = prepareLine(context, waves, sound, master.seat(sound.section));
    const envelope = envelopeOf(sound.technique, sound.midi);
    line.begin(0, envelope);
    line.complete(0);
    line.release(seconds, envelope.release);
  }
  const rendered = await context.render(false);
  const buffer = rendered.get();
  if (!buffer) throw new Error('the browser gave back no sound');
  return buffer;
}

function addFrom(into: Float32Array<ArrayBuffer>, samples: Float32Array, from: number): void {
  const length = Math.min(samples.length, into.length - from);
  for (let index = 0; index < length; index += 1) {
    into[from + index] = (into[from + index] ?? 0) + (samples[index] ?? 0);
  }
}

/**
 * Makes the sound of a schedule faster than it would take to hear it: chord by chord, each laid in at its
 * sample, so that nothing drifts and releases overlap as they do live.
 * @throws DOMException `AbortError` where the signal stops it
 */
export async function renderSchedule(
  schedule: readonly TimedSound[],
  settings: RenderSettings,
): Promise<RenderedSound> {
  const { sampleRate, room, onProgress, signal } = settings;
  const length = Math.ceil((endOf(schedule) + END_SECONDS + (room ? ROOM_SECONDS : 0)) * sampleRate);
  const [left, right] = [new Float32Array(length), new Float32Array(length)];
  for (const [index, entry] of schedule.entries()) {
    signal?.throwIfAborted();
    const buffer = await renderEntry(entry, settings);
    const from = Math.round(entry.startSeconds * sampleRate);
    addFrom(left, buffer.getChannelData(0), from);
    addFrom(right, buffer.getChannelData(1), from);
    onProgress?.((index + 1) / schedule.length);
  }
  signal?.throwIfAborted();
  return { sampleRate, left, right };
}
