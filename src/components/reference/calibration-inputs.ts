import { COMMON_PRACTICE_ORDERINGS } from '#shared/data/common-practice-orderings';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import {
  CLEAR_TRIAD,
  CLOSE_LOW_CHORDS,
  LOW_FIFTHS,
  MIDDLE_TRIAD,
  OCTAVES_BELOW,
  OPEN_CHORDS,
  PASSING_CHORDS,
} from '#shared/data/model-chords';
import { MUDDY_REGISTERS, REGISTER_RATINGS } from '#shared/data/register-ratings';
import { SCORE_CHORDS } from '#shared/data/score-chords';

interface Input {
  readonly name: string;
  readonly source: string;
}

const RATED = REGISTER_RATINGS.filter(({ register }) => register <= MUDDY_REGISTERS).length;
const MADE = [
  ...OPEN_CHORDS,
  ...CLOSE_LOW_CHORDS,
  ...PASSING_CHORDS,
  ...LOW_FIFTHS,
  ...OCTAVES_BELOW,
  CLEAR_TRIAD,
  MIDDLE_TRIAD,
].length;

const INPUTS: Readonly<Record<string, Input>> = {
  'shared/data/low-interval-limits': {
    name: `Low interval limits, ${LOW_INTERVAL_LIMITS.length} intervals with their published variants`,
    source: 'see the table of limits',
  },
  'shared/data/common-practice-orderings': {
    name: `Orderings, ${COMMON_PRACTICE_ORDERINGS.length} pairs of voicings, the first the muddier`,
    source: 'common practice of string arranging; no published source',
  },
  'shared/data/register-ratings': {
    name: `Listeners’ ratings of consonance, ${RATED} chords`,
    source: 'Eerola & Lahdelma, published data (journal from memory)',
  },
  'shared/data/score-chords': {
    name: `Chords of scores, ${SCORE_CHORDS.length}, none with a pair under its limit, as scored and dealt from the basses up`,
    source: 'public-domain scores in CC0 encodings',
  },
  'shared/data/model-chords': {
    name: `Model chords, ${MADE}: open, close and low, or passing a limit, also dealt from the basses up`,
    source: 'made up as yardsticks; no published source',
  },
};

/** @returns what the calibration read, each with its source; a table not known here by its own name */
export function calibrationInputs(paths: readonly string[]): readonly (readonly string[])[] {
  return paths.map((path) => {
    const { name, source } = INPUTS[path] ?? { name: path, source: '' };
    return [name, source];
  });
}
