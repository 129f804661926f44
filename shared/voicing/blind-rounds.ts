/** One of the two voicings that are compared. */
export type Side = 'held' | 'now';

/** One round of listening without knowing which is which. */
export interface BlindRound {
  /** The voicing that is called 1; the other is 2. */
  readonly first: Side;
}

/** What a reader said at the end of a round: which was clearer, or `null` where none was. */
export interface BlindAnswer extends BlindRound {
  readonly clearer: Side | null;
}

/** How often the same voicing was called clearer. */
export interface BlindCount {
  /** Rounds in which one was called clearer. */
  readonly rounds: number;
  /** Rounds in which none was. */
  readonly undecided: number;
  /** Rounds in which the voicing held was. */
  readonly held: number;
  readonly now: number;
}

const EVEN = 0.5;

/**
 * @param random evenly spread in 0 … 1
 * @example newRound(0.2).first // 'held'
 */
export function newRound(random: number): BlindRound {
  return { first: random < EVEN ? 'held' : 'now' };
}

/** @returns the voicing that stands behind a number */
export function sideOf({ first }: BlindRound, number: 1 | 2): Side {
  if (number === 1) return first;
  return first === 'held' ? 'now' : 'held';
}

/** @returns the number behind which a voicing stands */
export function numberOf({ first }: BlindRound, side: Side): 1 | 2 {
  return first === side ? 1 : 2;
}

/** @returns what the answers come to */
export function countAnswers(answers: readonly BlindAnswer[]): BlindCount {
  const of = (side: Side | null): number => answers.filter(({ clearer }) => clearer === side).length;
  return { rounds: of('held') + of('now'), undecided: of(null), held: of('held'), now: of('now') };
}

/**
 * How likely it is that somebody who hears nothing calls one and the same voicing clearer at least so often,
 * whichever of the two: the two-sided binomial test with even chances.
 * @param most how often the one that was chosen more often was chosen, at least half of the rounds
 * @param rounds 1 or more
 * @returns a probability, 1 where both were chosen equally often
 * @throws RangeError where `most` is no count of the rounds, or less than half of them
 * @source the binomial distribution
 * @example chanceOf(5, 6) // 14 / 64
 */
export function chanceOf(most: number, rounds: number): number {
  if (!Number.isInteger(most) || most > rounds || 2 * most < rounds || rounds < 1) {
    throw new RangeError(`${most} of ${rounds} rounds is not the larger count`);
  }
  let ways = 1;
  let sum = 0;
  for (let chosen = 0; chosen <= rounds; chosen += 1) {
    if (chosen >= most) sum += ways;
    ways = (ways * (rounds - chosen)) / (chosen + 1);
  }
  return Math.min((2 * sum) / 2 ** rounds, 1);
}
