import { MUDDINESS_CONSTANTS } from '#shared/data/muddiness-constants';
import type { Hertz, Semitones } from '#shared/units';
import type { MuddinessModel } from '#shared/voicing/muddiness/model';
import { muddinessModel } from '#shared/voicing/muddiness/model';

/** Halving it moves no chord's index by a point; see the tests of the index. */
export const AXIS_STEP: Semitones = 0.5;
/** A workbench holds one or two pitches of A4 at once. */
const MOST_MODELS = 3;

/** The tables of a model cost more than its answers: they are kept, the latest few. */
const models = new Map<Hertz, MuddinessModel>();

/**
 * @returns the index's machinery with the constants in force for an A4, the same one each time; what it has
 *   computed before only makes it quicker
 */
export function modelFor(a4Hz: Hertz): MuddinessModel {
  const known = models.get(a4Hz);
  if (known) return known;
  const [oldest] = models.keys();
  if (models.size >= MOST_MODELS && oldest !== undefined) models.delete(oldest);
  const model = muddinessModel(MUDDINESS_CONSTANTS, a4Hz, AXIS_STEP);
  models.set(a4Hz, model);
  return model;
}
