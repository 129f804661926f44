import type { Section } from '#shared/strings/sections';

/** Side of the square in which a section's sign is drawn. */
export const MARK_SIZE = 10;

/** The sections' signs as paths, drawn so that they look the same in every font. */
export const SECTION_MARKS: Readonly<Record<Section, string>> = {
  violin1: 'M5 0.5a4.5 4.5 0 1 0 0.001 0Z',
  violin2: 'M5 0 10 5 5 10 0 5Z',
  viola: 'M0.8 0.8H9.2V9.2H0.8Z',
  cello: 'M5 0.6 10 9.4H0Z',
  doubleBass: 'M0 3H10V7H0Z',
};
