import type { Section } from '#shared/strings/sections';

/**
 * Where each section sits in the stereo picture, −1 left … 1 right, as the audience hears it: first violins
 * on the left, basses on the right. Nothing goes further than 0.56, so that either ear alone still hears all of
 * it and the sum of both channels keeps every section within 1 dB.
 * @source common practice (violins to basses from left to right); the bound by calculation, see the tests
 */
export const SEATS: Readonly<Record<Section, number>> = {
  violin1: -0.56,
  violin2: -0.28,
  viola: 0,
  cello: 0.28,
  doubleBass: 0.56,
};
