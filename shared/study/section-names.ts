import type { Section } from '#shared/strings/sections';

/** A section as it is typed into the line, and as the line writes it back. */
export const TYPED_SECTIONS: Readonly<Record<Section, string>> = {
  violin1: 'Vn1',
  violin2: 'Vn2',
  viola: 'Va',
  cello: 'Vc',
  doubleBass: 'DB',
};

/** A name ends where neither a letter, a figure nor an accidental follows: `DB D2` against `Db2`. */
const END = '(?![\\p{L}\\p{N}♭♯#])';
const VIOLINS = '(?:violins?|vlns?|vn|vl|v)';

const pattern = (source: string): RegExp => new RegExp(`(?:${source})${END}`, 'iuy');

const PATTERNS: readonly (readonly [Section | 'violins', RegExp])[] = [
  ['violin1', pattern(`${VIOLINS}[\\s.]*(?:1|i)|(?:first|1st)\\s+violins?`)],
  ['violin2', pattern(`${VIOLINS}[\\s.]*(?:2|ii)|(?:second|2nd)\\s+violins?`)],
  ['violins', pattern('(?:violins?|vlns?|vn|vl)\\.?')],
  ['viola', pattern('(?:violas?|vlas?|va|br)\\.?')],
  ['cello', pattern('(?:violoncell(?:os?|i)|cell(?:os?|i)|vlc|vc)\\.?')],
  ['doubleBass', pattern('(?:double\\s*bass(?:es)?|contrabass(?:es|i)?|bass(?:es)?|db|cb|kb)\\.?')],
];

/** A section's name found in a line; `violins` where it does not say which. */
export interface ReadSection {
  readonly section: Section | 'violins';
  readonly end: number;
}

/**
 * Reads a section's name, forgiving of case and of the usual abbreviations.
 * @param text the line
 * @param start where the name would begin
 * @returns the section and where its name ends, or `null` where no section is named there
 * @example readSection('Vn II D4', 0) // { section: 'violin2', end: 5 }
 */
export function readSection(text: string, start: number): ReadSection | null {
  for (const [section, regex] of PATTERNS) {
    regex.lastIndex = start;
    const match = regex.exec(text);
    if (match) return { section, end: start + match[0].length };
  }
  return null;
}
