import type { Instrument } from '#shared/strings/sections';
import type { Dynamic } from '#shared/study/study.document';
import type { Decibels } from '#shared/units';

export const PLAYER_LEVELS_SOURCE =
  'Typical forte of one player, dB re 1 pW: J. Meyer, Acoustics and the Performance of Music (5th ed. 2009), ' +
  'ch. 3, from memory. The step of 5 dB from one dynamic to the next is common practice, from memory.';

/** Sound power level of one player at forte. @source see {@link PLAYER_LEVELS_SOURCE} */
export const FORTE_POWER_LEVEL: Readonly<Record<Instrument, Decibels>> = {
  violin: 89,
  viola: 87,
  cello: 90,
  doubleBass: 92,
};

/** Level of a dynamic against mf. @source see {@link PLAYER_LEVELS_SOURCE} */
export const DYNAMIC_LEVELS: Readonly<Record<Dynamic, Decibels>> = {
  ppp: -20,
  pp: -15,
  p: -10,
  mp: -5,
  mf: 0,
  f: 5,
  ff: 10,
  fff: 15,
};
