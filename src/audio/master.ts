import { Analyser, Compressor, Gain, Panner, WaveShaper, type BaseContext } from 'tone';
import { amplitudeOf, levelOf } from '@/audio/levels';
import { makeUpGain } from '@/audio/make-up-gain';
import { buildRoom } from '@/audio/room-node';
import { SEATS } from '@/audio/seats';
import { SECTIONS, type Section } from '#shared/strings/sections';
import type { Decibels } from '#shared/units';

/** The way of the sound from the sections to the loudspeaker. */
export interface Master {
  seat(section: Section): Gain;
  setSections(heard: readonly Section[], at: number): void;
  /** The common scale of what is played: at once in silence, gliding otherwise. */
  setScale(scale: number, at: number, glide: boolean): void;
  setVolume(volume: Decibels, at: number): void;
  setRoom(on: boolean, at: number): void;
  /** Lets what still rings in the room fall silent at once. */
  emptyRoom(): void;
  peak(): Decibels;
}

/** Above this the limiter holds the level down; up to it nothing is altered. Chosen. */
const LIMIT: Decibels = -3;
const LIMITER = { threshold: LIMIT, ratio: 20, attack: 0.003, release: 0.1, knee: 0 };
/** No peak that slips through the limiter's attack passes full scale: identity up to ±1, then flat. */
const CEILING = [-1, 1];
const GLIDE_SECONDS = 0.05;
const METER_SAMPLES = 1024;

/** How the way out begins. */
export interface MasterSettings {
  readonly volume: Decibels;
  readonly room: boolean;
  /** Nothing is held down where the whole is brought to its level afterwards. */
  readonly limited: boolean;
}

function seatOf(context: BaseContext, section: Section, into: Gain): Gain {
  const panner = new Panner({ context, pan: SEATS[section] }).connect(into);
  return new Gain({ context, gain: 1 }).connect(panner);
}

function limited(context: BaseContext, input: Gain): Gain {
  const exact = new Gain({ context, gain: 1 / makeUpGain(LIMITER.threshold, LIMITER.ratio) });
  const ceiling = new WaveShaper({ context, mapping: CEILING });
  const output = new Gain({ context, gain: 1 });
  input.chain(new Compressor({ context, ...LIMITER }), exact, ceiling, output);
  return output;
}

function peakOf(meter: Analyser<2>): Decibels {
  const channels = meter.getValue();
  return levelOf(
    channels.reduce((peak, samples) => samples.reduce((most, x) => Math.max(most, Math.abs(x)), peak), 0),
  );
}

/** Builds the way out: seats, common scale, room, volume, limiter, ceiling, meter. */
export function buildMaster(context: BaseContext, settings: MasterSettings): Master {
  const loudness = new Gain({ context, gain: amplitudeOf(settings.volume) });
  const room = buildRoom(context, loudness, settings.room);
  const scale = new Gain({ context, gain: 0 }).connect(room.input);
  const meter = new Analyser({ context, type: 'waveform', size: METER_SAMPLES, channels: 2 });
  const output = settings.limited ? limited(context, loudness) : loudness;
  output.fan(meter, context.destination);
  const seats = new Map(SECTIONS.map((section) => [section, seatOf(context, section, scale)]));
  return {
    seat: (section) => seats.get(section) ?? scale,
    setSections(heard, at) {
      seats.forEach((seat, section) =>
        seat.gain.linearRampTo(heard.includes(section) ? 1 : 0, GLIDE_SECONDS, at),
      );
    },
    setScale(value, at, glide) {
      if (glide) scale.gain.linearRampTo(value, GLIDE_SECONDS, at);
      else scale.gain.cancelScheduledValues(0).setValueAtTime(value, at);
    },
    setVolume: (value, at) => void loudness.gain.linearRampTo(amplitudeOf(value), GLIDE_SECONDS, at),
    setRoom: room.setOn,
    emptyRoom: room.empty,
    peak: () => peakOf(meter),
  };
}
