import { connect, Gain, getContext } from 'tone';
import type { Envelope } from '@/audio/envelope';
import { seedOf, wavesOf, type Wave } from '@/audio/waves';
import type { VoiceSound } from '#shared/voicing/analysis';

/** One voice that sounds. Times are those of the audio clock, in seconds. */
export interface Line {
  readonly sound: VoiceSound;
  /** When it has ended and can be put away; Infinity while nobody has ended it. */
  readonly endsAt: number;
  beganBefore(moment: number): boolean;
  begin(at: number, envelope: Envelope): void;
  /** Lets it end. A line that has not begun by then never does. */
  release(at: number, seconds: number): void;
  dispose(): void;
}

/** 60 dB below the full level. */
const DECAYED = 0.001;
/** The oscillators go on a little after the level has reached 0. */
const AFTER = 0.02;

function oscillatorOf(wave: Wave, into: Gain) {
  const context = getContext();
  const node = context.createOscillator();
  node.setPeriodicWave(context.createPeriodicWave(wave.real, wave.imag, { disableNormalization: true }));
  node.frequency.value = wave.fundamentalHz;
  connect(node, into);
  return node;
}

/**
 * Prepares one voice: its partials at their levels against 0 dB, each as exact as an oscillator is. The waves
 * take milliseconds to make, so that the moment of beginning is read from the clock afterwards.
 */
export function prepareLine(sound: VoiceSound, into: Gain): Line {
  const level = new Gain(0).connect(into);
  const oscillators = wavesOf(sound.partials, seedOf(sound.id)).map((wave) => oscillatorOf(wave, level));
  let beginsAt = Infinity;
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
    beganBefore: (moment) => beginsAt < moment,
    begin(at, { attack, decay }) {
      beginsAt = at;
      level.gain.setValueAtTime(0, at).linearRampToValueAtTime(1, at + attack);
      if (decay !== null) level.gain.exponentialRampToValueAtTime(DECAYED, at + attack + decay);
      oscillators.forEach((node) => node.start(at));
    },
    release(from, seconds) {
      if (endsAt <= from) return;
      if (from <= beginsAt) {
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
