import type { Midi } from '#shared/units';

/** The five sections, from the top of the score to the bottom. */
export const SECTIONS = ['violin1', 'violin2', 'viola', 'cello', 'doubleBass'] as const;
export type Section = (typeof SECTIONS)[number];

/** The four kinds of instrument that the sections play. */
export type Instrument = 'violin' | 'viola' | 'cello' | 'doubleBass';

/** Double basses: four strings, four with the low extension to C1, or five strings down to B0. */
export const BASS_KINDS = ['four-string', 'extension', 'five-string'] as const;
export type BassKind = (typeof BASS_KINDS)[number];

export interface SectionFacts {
  readonly section: Section;
  readonly instrument: Instrument;
  /** As it stands at the head of a sentence: "The cellos". */
  readonly plural: string;
  /** The short name of the score, which is also how it is typed. */
  readonly short: string;
  /** The section's sign wherever its colour is used, so that colour is never the only one. */
  readonly mark: string;
}

export const SECTION_FACTS: Readonly<Record<Section, SectionFacts>> = {
  violin1: { section: 'violin1', instrument: 'violin', plural: 'first violins', short: 'Vn I', mark: '●' },
  violin2: { section: 'violin2', instrument: 'violin', plural: 'second violins', short: 'Vn II', mark: '◆' },
  viola: { section: 'viola', instrument: 'viola', plural: 'violas', short: 'Va', mark: '■' },
  cello: { section: 'cello', instrument: 'cello', plural: 'cellos', short: 'Vc', mark: '▲' },
  doubleBass: {
    section: 'doubleBass',
    instrument: 'doubleBass',
    plural: 'double basses',
    short: 'DB',
    mark: '▬',
  },
};

/** Players per section. */
export type Players = Readonly<Record<Section, number>>;

/** An inclusive range of sounding pitches. */
export interface PitchRange {
  readonly low: Midi;
  readonly high: Midi;
}
