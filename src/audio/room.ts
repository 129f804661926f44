import type { Decibels, Hertz } from '#shared/units';

/** How a small hall answers: a moment later, dying away, the same in neither ear. */
export interface RoomAnswer {
  readonly left: Float32Array<ArrayBuffer>;
  readonly right: Float32Array<ArrayBuffer>;
}

/** How much of the room is heard beside the direct sound: discreet. Chosen. */
export const ROOM_LEVEL: Decibels = -15;
/** All of the answer; after it nothing is left. */
export const ROOM_SECONDS = 0.9;
/** Time in which the answer dies away by 60 dB. Chosen: a chamber hall's middle, shortened. */
const DECAY_SECONDS = 0.85;
/** The first reflection comes from a wall a few metres away. */
const PREDELAY_SECONDS = 0.014;
/** Under this the room answers less and less, so that what clouds below is the chord and not the room. */
const LOW_EDGE: Hertz = 180;
/** Walls and air take the top away. */
const HIGH_EDGE: Hertz = 4500;
const SIXTY_DECIBELS = Math.log(1000);
const SEEDS = [1234567, 7654321] as const;
const STEP = 48271;
const MODULUS = 2147483647;

/** Even noise from −1 to 1, the same every time. */
function noise(seed: number, length: number): Float32Array<ArrayBuffer> {
  let state = seed;
  return Float32Array.from({ length }, () => {
    state = (state * STEP) % MODULUS;
    return (2 * state) / MODULUS - 1;
  });
}

/** One pole each way takes off what lies under the low and over the high edge. */
function withinEdges(samples: Float32Array<ArrayBuffer>, sampleRate: Hertz): Float32Array<ArrayBuffer> {
  const pole = (edge: Hertz) => 1 - Math.exp((-2 * Math.PI * edge) / sampleRate);
  const [low, high] = [pole(LOW_EDGE), pole(HIGH_EDGE)];
  let [slow, fast] = [0, 0];
  return samples.map((sample) => {
    fast += high * (sample - fast);
    slow += low * (fast - slow);
    return fast - slow;
  });
}

function dyingAway(samples: Float32Array<ArrayBuffer>, sampleRate: Hertz): Float32Array<ArrayBuffer> {
  const late = Math.round(PREDELAY_SECONDS * sampleRate);
  const fadeOut = samples.length - late;
  return samples.map((sample, index) => {
    if (index < late) return 0;
    const seconds = (index - late) / sampleRate;
    return sample * Math.exp((-SIXTY_DECIBELS * seconds) / DECAY_SECONDS) * (1 - (index - late) / fadeOut);
  });
}

function ofUnitEnergy(samples: Float32Array<ArrayBuffer>): Float32Array<ArrayBuffer> {
  const energy = samples.reduce((sum, sample) => sum + sample ** 2, 0);
  return samples.map((sample) => sample / Math.sqrt(energy));
}

/**
 * The answer of a small room to one short sound, made by calculation and the same every time: noise that dies
 * away. Each ear's has the energy 1, so that broad sound comes back as strong as it went in.
 * @param sampleRate samples a second, > 0
 * @example roomAnswer(48000).left.length // 43200
 */
export function roomAnswer(sampleRate: Hertz): RoomAnswer {
  const length = Math.round(ROOM_SECONDS * sampleRate);
  const [left, right] = SEEDS.map((seed) =>
    ofUnitEnergy(dyingAway(withinEdges(noise(seed, length), sampleRate), sampleRate)),
  );
  if (!left || !right) throw new RangeError('a room answers both ears');
  return { left, right };
}
