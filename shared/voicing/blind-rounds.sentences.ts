import { chanceOf, numberOf, type BlindAnswer, type BlindCount } from '#shared/voicing/blind-rounds';
import type { IndexChange } from '#shared/voicing/comparison';
import type { ComparedNames } from '#shared/voicing/comparison.sentences';

const PERCENT = 100;
/** Fewer rounds than this say little: six the same way come by chance in 3 of 100 tries, five in 6. */
const ROUNDS_WORTH_COUNTING = 6;

/** @returns which was which: `1 was A, 2 was B.` */
export function revealText(answer: BlindAnswer, names: ComparedNames): string {
  const [one, two] = answer.first === 'held' ? [names.held, names.now] : [names.now, names.held];
  return `1 was ${one}, 2 was ${two}.`;
}

/**
 * What the reader said, and whether the index says so too.
 * @example answerText({ first: 'now', clearer: 'now' }, index, names) // 'You called 1 clearer, which is B. The index …'
 */
export function answerText(answer: BlindAnswer, index: IndexChange, names: ComparedNames): string {
  const { clearer } = answer;
  const said =
    clearer === null
      ? 'You heard neither as clearer.'
      : `You called ${numberOf(answer, clearer)} clearer: that is ${names[clearer]}.`;
  if (!index.clear) return `${said} The index finds no clear difference.`;
  const byIndex = index.now < index.held ? 'now' : 'held';
  if (byIndex === clearer) return `${said} The index says the same.`;
  return `${said} The index finds ${names[byIndex]} clearer; it is a model, and ears come first.`;
}

/**
 * How often the same voicing was called clearer, beside what guessing gives.
 * @example countText({ rounds: 6, undecided: 0, held: 1, now: 5 }, names) // 'B was called clearer in 5 of 6 rounds. …'
 */
export function countText({ rounds, undecided, held, now }: BlindCount, names: ComparedNames): string {
  const aside = undecided === 0 ? '' : ` ${roundsText(undecided)} without a choice, not counted.`;
  if (rounds === 0) return `No round with a choice yet.${aside}`;
  const most = Math.max(held, now);
  const told =
    held === now
      ? `Each was called clearer in ${held} of ${rounds} rounds, as guessing gives on the average.`
      : `${held > now ? names.held : names.now} was called clearer in ${most} of ${roundsText(rounds)}. ` +
        `By guessing alone one of the two comes out so often, or oftener, in ${percent(chanceOf(most, rounds))} of tries.`;
  const few =
    rounds < ROUNDS_WORTH_COUNTING ? ` Go on to ${ROUNDS_WORTH_COUNTING} rounds before you trust it.` : '';
  return `${told}${few}${aside}`;
}

function roundsText(rounds: number): string {
  return rounds === 1 ? '1 round' : `${rounds} rounds`;
}

function percent(share: number): string {
  const rounded = Math.round(share * PERCENT);
  return rounded === 0 ? 'fewer than 1 %' : `${rounded} %`;
}
