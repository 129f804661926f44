import { SECTION_FACTS, type Section } from '#shared/strings/sections';
import type { Hertz, Semitones } from '#shared/units';
import type { Register } from '#shared/voicing/registers';

/** Below this many hertz a tenth is told, from here on whole ones. */
const WHOLE_HERTZ_FROM = 9.95;

const SOLO: Readonly<Record<Section, string>> = {
  violin1: 'first violin',
  violin2: 'second violin',
  viola: 'viola',
  cello: 'cello',
  doubleBass: 'double bass',
};

/** @returns a register as it stands in a sentence: `the great octave` */
export function registerName(register: Register): string {
  return register === 'three-line and up' ? 'the three-line octave and above' : `the ${register} octave`;
}

/** @returns whose note it is: `the cellos’`, of one player `the cello’s` */
export function possessive(section: Section, players: number): string {
  return players === 1 ? `the ${SOLO[section]}’s` : `the ${SECTION_FACTS[section].plural}’`;
}

/** @returns hertz with unit and sensible digits: `6.2 Hz`, `110 Hz` */
export function hertzText(hertz: Hertz): string {
  return `${hertz < WHOLE_HERTZ_FROM ? hertz.toFixed(1) : Math.round(hertz)} Hz`;
}

/** @returns `1 semitone`, `7 semitones` */
export function semitonesText(semitones: Semitones): string {
  const whole = Math.round(semitones);
  return `${whole} ${whole === 1 ? 'semitone' : 'semitones'}`;
}

/** @returns the text with a capital at its head */
export function sentence(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
