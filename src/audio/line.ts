import { connect, Gain, getContext } from 'tone';
import type { Envelope } from '@/audio/envelope';
import { seedOf, wavesOf, type Wave } from '@/audio/waves';
import type { VoiceSound } from '#shared/voicing/analysis';

/** One voice that sounds. Times are those of the audio clock, in seconds. */
export interface Line {
  readonly sound: VoiceSound;
  /** When it has ended and can be put away; Infinity while nobody has ended it. */
  readonly endsAt: number;
  /** Lets it end. A line that has not begun by then never does. */
  release(at: number, seconds: number): void;
  dispose(): void;
}

interface LineStart {
  readonly sound: VoiceSound;
  readonly into: Gain;
  readonly at: number;
  readonly envelope: Envelope;
}

/** 60 dB below the full level. */
const DECAYED = 0.001;
/** The oscillators go on a little after the level has reached 0. */
const AFTER = 0.02;

function oscillator(wave: Wave, into: Gain, at: number) {
  const context = getContext();
  const node = context.createOscillator();
  node.setPeriodicWave(context.createPeriodicWave(wave.real, wave.imag, { disableNormalization: true }));
  node.frequency.value = wave.fundamentalHz;
  connect(node, into);
  node.start(at);
  return node;
}

function openingGain(at: number, { attack, decay }: Envelope): Gain {
  const level = new Gain(0);
  level.gain.setValueAtTime(0, at).linearRampToValueAtTime(1, at + attack);
  if (decay !== null) level.gain.exponentialRampToValueAtTime(DECAYED, at + attack + decay);
  return level;
}

/** Starts one voice: its partials at their levels against 0 dB, each as exact as an oscillator is. */
export function startLine({ sound, into, at, envelope }: LineStart): Line {
  const level = openingGain(at, envelope).connect(into);
  const oscillators = wavesOf(sound.partials, seedOf(sound.id)).map((wave) => oscillator(wave, level, at));
  let endsAt = Infinity;
  const stopAt = (time: number): void => {
    endsAt = time;
    oscillators.forEach((node) => node.stop(time));
  };
  return {
    sound,
    get endsAt() {
      return endsAt;
    },
    release(from, seconds) {
      if (endsAt <= from) return;
      if (from <= at) {
        level.disconnect();
        stopAt(from);
        return;
      }
      level.gain.linearRampTo(0, seconds, from);
      stopAt(from + seconds + AFTER);
    },
    dispose() {
      oscillators.forEach((node) => node.disconnect());
      level.dispose();
    },
  };
}
