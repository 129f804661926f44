import { rangeOf } from '#shared/strings/ranges';
import type { BassKind, PitchRange, Section } from '#shared/strings/sections';
import type { Reach } from '#shared/study/dealing';

function comfortable(section: Section, bass: BassKind): PitchRange {
  const { lowest, comfortableTop } = rangeOf(section, bass);
  return { low: lowest, high: comfortableTop };
}

/**
 * @param bass which double basses play
 * @returns where each section plays comfortably, sounding, as notes are dealt to them
 * @example comfortableReach('four-string').cello.low // 36, C2
 */
export function comfortableReach(bass: BassKind): Reach {
  return {
    violin1: comfortable('violin1', bass),
    violin2: comfortable('violin2', bass),
    viola: comfortable('viola', bass),
    cello: comfortable('cello', bass),
    doubleBass: comfortable('doubleBass', bass),
  };
}
