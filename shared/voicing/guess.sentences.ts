import type { ChordAnalysis } from '#shared/voicing/analysis';
import type { Register } from '#shared/voicing/registers';
import { CLEAR_BELOW } from '#shared/voicing/sentences';
import { registerName } from '#shared/voicing/words';

/** Where one takes the figure to be, against the mark at 50. */
export const GUESSED_LEVELS = ['under', 'about', 'over'] as const;
export type GuessedLevel = (typeof GUESSED_LEVELS)[number];

/** What somebody took a chord for before they saw its figures. */
export interface Guess {
  readonly register: Register | 'clear';
  readonly level: GuessedLevel;
}

/** A guess beside what the model says. */
export interface GuessTold {
  readonly guess: string;
  readonly model: string;
  readonly together: string;
}

const MARK = 50;
/** So near to the mark nobody can be asked to tell it from 50: our own choice. */
const ABOUT = 5;

/** @returns on which side of 50 the model's figure lies; about 50 where it can say no more */
export function levelOf(index: number, uncertainty: number): GuessedLevel {
  if (Math.abs(index - MARK) <= Math.max(uncertainty, ABOUT)) return 'about';
  return index < MARK ? 'under' : 'over';
}

function sameRegister({ register }: Guess, { muddiness }: ChordAnalysis): boolean {
  if (register === 'clear') return muddiness.index < CLEAR_BELOW;
  const own = muddiness.registers.find((found) => found.register === register);
  // Two registers that stand nearer than the figure is sure are equally good answers.
  return own !== undefined && own.index > 0 && muddiness.index - own.index <= muddiness.uncertainty;
}

function togetherText(register: boolean, level: boolean): string {
  if (register && level) return 'You and the model hear it alike.';
  if (register) return 'You agree where; how much, you and the model see differently.';
  if (level) return 'You agree how much; where, you and the model see differently.';
  return 'You and the model part here: listen once more before you side with either.';
}

/**
 * Lays a guess beside the model's figures, without calling either of them wrong.
 * @param guess made before the figures were seen
 * @param analysis of the chord
 * @example guessTold({ register: 'great', level: 'over' }, analysis).together // 'You and the model hear it alike.'
 */
export function guessTold(guess: Guess, analysis: ChordAnalysis): GuessTold {
  const { index, uncertainty, register } = analysis.muddiness;
  const figure = `${Math.round(index)}, give or take ${Math.round(uncertainty)}`;
  const where = register && index > 0 ? `cloudiest in ${registerName(register)}` : 'nothing clouds';
  const place = guess.register === 'clear' ? 'clear' : registerName(guess.register);
  return {
    guess: `You: ${place}, ${guess.level} ${MARK}.`,
    model: `The model: ${where}, ${figure}.`,
    together: togetherText(sameRegister(guess, analysis), guess.level === levelOf(index, uncertainty)),
  };
}
