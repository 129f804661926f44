import type { Cents, Hertz } from '#shared/units';

/** One player, or a group of them, of a voice: how they stand to its plotted sound. */
export interface Player {
  /** From the voice's pitch. */
  readonly cents: Cents;
  /** Of the voice's amplitude; the squares of all players' shares add up to 1. */
  readonly share: number;
  /** How long after the first one, in periods of the voice's fundamental; the first has 0. */
  readonly laterPeriods: number;
}

/**
 * The voice's middle carries this share, the others the rest of the energy in mirrored pairs. As their waves
 * stand a quarter of a period from the middle's, a partial swells and fades by −2 to +3 dB and never goes out.
 * @source calculated: |0.8 + 0.6i·(cos a + cos b)|² runs from 0.64 to 2.08, its mean is 1
 */
const MIDDLE_SHARE = 0.8;
/** Where in their common swell a pair of players begins, so that no low partial begins far from its level. */
const TWO_PAIRS_BEGIN = [62 / 360, 80 / 360] as const;
const ONE_PAIR_BEGINS = [8 / 360] as const;
/** From so many players on there are two pairs. Chosen. */
const MANY = 4;

/** Inner and outer pair's distance from the middle, each within these bounds: "a few cents". Chosen by ear's bounds. */
const PAIR_CENTS = [
  { least: 3, most: 5 },
  { least: 6, most: 9 },
] as const;
/** Nobody in a section begins exactly together. Chosen: well under what is heard as two attacks. */
const LATE_SECONDS = { least: 0.004, most: 0.02 } as const;

/** Multiplier and modulus of a short linear congruential generator; its low quality is enough for a spread. */
const STEP = 16807;
const MODULUS = 2147483647;

/** @returns the same numbers from 0 to 1 for the same seed */
function drawsOf(seed: number): () => number {
  let state = (seed % (MODULUS - 1)) + 1;
  const next = (): number => {
    state = (state * STEP) % MODULUS;
    return state / MODULUS;
  };
  next();
  return next;
}

function between({ least, most }: { readonly least: number; readonly most: number }, draw: number): number {
  return least + (most - least) * draw;
}

/**
 * How a voice's players differ: a solo not at all; a section by a few cents and milliseconds, mirrored round
 * its middle, so that the plotted level and pitch of each partial are the mean of what sounds.
 * @param players ≥ 1
 * @param fundamentalHz of the voice, > 0
 * @param seed any whole number ≥ 0, the same for the same voice
 * @returns the middle first, then each pair's upper and lower player
 * @example playersOf(1, 110, 7) // [{ cents: 0, share: 1, laterPeriods: 0 }]
 */
export function playersOf(players: number, fundamentalHz: Hertz, seed: number): readonly Player[] {
  if (players <= 1) return [{ cents: 0, share: 1, laterPeriods: 0 }];
  const draw = drawsOf(seed);
  const begins = players < MANY ? ONE_PAIR_BEGINS : TWO_PAIRS_BEGIN;
  const middle = { cents: 0, share: MIDDLE_SHARE, laterPeriods: 0 };
  const share = Math.sqrt((1 - MIDDLE_SHARE ** 2) / (2 * begins.length));
  const pairs = begins.flatMap((begin, index) => {
    const away = between(PAIR_CENTS[index] ?? PAIR_CENTS[0], draw());
    const periods = Math.ceil(between(LATE_SECONDS, draw()) * fundamentalHz);
    return [
      { cents: away, share, laterPeriods: periods + begin },
      { cents: -away, share, laterPeriods: periods - begin },
    ];
  });
  return [middle, ...pairs];
}

/**
 * @param id of a voice
 * @returns a whole number for {@link playersOf}, the same for the same id
 * @example seedOf('AB') // 65 * 31 + 66
 */
export function seedOf(id: string): number {
  const BASE = 31;
  const BOUND = 1_000_003;
  return [...id].reduce((sum, letter) => (sum * BASE + letter.charCodeAt(0)) % BOUND, 0);
}
