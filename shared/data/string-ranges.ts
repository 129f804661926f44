import type { Instrument } from '#shared/strings/sections';

/** How far an instrument reaches, by sounding pitch. */
export interface StringRange {
  /** Open strings, the highest first; a player's I, II, III, IV. */
  readonly openStrings: readonly string[];
  /** Up to here any player is at ease. From memory of orchestration handbooks. */
  readonly comfortableTop: string;
  /** The top of orchestral writing. From memory of orchestration handbooks. */
  readonly orchestralTop: string;
  /** The top of solo writing. From memory of orchestration handbooks. */
  readonly soloTop: string;
}

export const STRING_RANGES_SOURCE =
  'Open strings and transposition as in published handbooks of orchestration; the tops from memory of them.';

/** @source see {@link STRING_RANGES_SOURCE} */
export const STRING_RANGES: Readonly<Record<Instrument, StringRange>> = {
  violin: {
    openStrings: ['E5', 'A4', 'D4', 'G3'],
    comfortableTop: 'E6',
    orchestralTop: 'E7',
    soloTop: 'A7',
  },
  viola: { openStrings: ['A4', 'D4', 'G3', 'C3'], comfortableTop: 'A5', orchestralTop: 'E6', soloTop: 'A6' },
  cello: { openStrings: ['A3', 'D3', 'G2', 'C2'], comfortableTop: 'G4', orchestralTop: 'A5', soloTop: 'E6' },
  doubleBass: {
    openStrings: ['G2', 'D2', 'A1', 'E1'],
    comfortableTop: 'G3',
    orchestralTop: 'Bb3',
    soloTop: 'G4',
  },
};

/** The double bass's low extension of its fourth string reaches C1. */
export const EXTENSION_LOWEST = 'C1';
/** The fifth string of a five-string double bass. */
export const FIFTH_STRING = 'B0';
