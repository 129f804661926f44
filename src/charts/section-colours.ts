import type { Section } from '#shared/strings/sections';

const TOKENS: Readonly<Record<Section, string>> = {
  violin1: '--violin1',
  violin2: '--violin2',
  viola: '--viola',
  cello: '--cello',
  doubleBass: '--double-bass',
};

/** @returns the name of the section's colour token */
export function sectionToken(section: Section): string {
  return TOKENS[section];
}

/** @returns the section's colour for a style */
export function sectionColour(section: Section): string {
  return `var(${TOKENS[section]})`;
}
