import type { BaseContext } from 'tone';
import { isTurned, wavesOf, type WaveKind } from '@/audio/waves';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { Hertz } from '#shared/units';

/** A wave as the browser plays it. */
export interface ReadyWave {
  readonly fundamentalHz: Hertz;
  readonly periodic: PeriodicWave;
}

/** Waves of one audio context, each made once: the browser takes milliseconds to make one. */
export interface WaveStore {
  of(sound: VoiceSound, kind: WaveKind): readonly ReadyWave[];
  has(sound: VoiceSound, kind: WaveKind): boolean;
  /** Any other periodic wave, by a name of its own. */
  named(name: string, real: readonly number[], imag: readonly number[]): PeriodicWave;
}

/** Enough for four chords of forty voices; the ones not used for longest give way. */
const MOST_KEPT = 320;

function keyOf({ section, partials }: VoiceSound, kind: WaveKind): string {
  const lines = partials.map(({ n, frequencyHz, levelDb }) => `${n},${frequencyHz},${levelDb}`);
  return `${kind} ${isTurned(section)} ${lines.join(' ')}`;
}

/** Makes the store of one audio context. */
export function createWaveStore(context: BaseContext): WaveStore {
  const kept = new Map<string, readonly ReadyWave[]>();
  const names = new Map<string, PeriodicWave>();
  const make = (real: Float32Array<ArrayBuffer>, imag: Float32Array<ArrayBuffer>): PeriodicWave =>
    context.createPeriodicWave(real, imag, { disableNormalization: true });

  function keep(key: string, waves: readonly ReadyWave[]): readonly ReadyWave[] {
    kept.delete(key);
    kept.set(key, waves);
    const [oldest] = kept.keys();
    if (kept.size > MOST_KEPT && oldest !== undefined) kept.delete(oldest);
    return waves;
  }

  return {
    has: (sound, kind) => kept.has(keyOf(sound, kind)),
    of(sound, kind) {
      const key = keyOf(sound, kind);
      const known = kept.get(key);
      if (known) return keep(key, known);
      const waves = wavesOf(sound.partials, isTurned(sound.section), kind).map(
        ({ fundamentalHz, real, imag }) => ({
          fundamentalHz,
          periodic: make(real, imag),
        }),
      );
      return keep(key, waves);
    },
    named(name, real, imag) {
      const wave = names.get(name) ?? make(Float32Array.from(real), Float32Array.from(imag));
      names.set(name, wave);
      return wave;
    },
  };
}
