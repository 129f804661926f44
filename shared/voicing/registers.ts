import type { Midi } from '#shared/units';

/** The trade's octave names, low to high. */
export const REGISTERS = [
  'subcontra',
  'contra',
  'great',
  'small',
  'one-line',
  'two-line',
  'three-line and up',
] as const;
export type Register = (typeof REGISTERS)[number];

/** Bounds of a register on the pitch axis; edges lie a quarter tone under each C. */
export interface RegisterBounds {
  readonly register: Register;
  readonly low: Midi;
  readonly high: Midi;
}

const C0: Midi = 12;
const E8: Midi = 112;
const QUARTER_TONE = 0.5;

/**
 * The seven registers with their edges in MIDI numbers: subcontra to B0, contra C1–B1, great C2–B2,
 * small C3–B3, one-line C4–B4, two-line C5–B5, three-line and up to E8.
 */
export const REGISTER_BOUNDS: readonly RegisterBounds[] = REGISTERS.map((register, index) => ({
  register,
  low: C0 + 12 * index - QUARTER_TONE,
  high: index === REGISTERS.length - 1 ? E8 : C0 + 12 * (index + 1) - QUARTER_TONE,
}));

/** @returns the register in which a pitch lies; below C0 and above E8 the nearest one. */
export function registerOf(midi: Midi): Register {
  return REGISTERS[registerNumber(midi)] ?? 'subcontra';
}

/** @returns the same as its place among the registers, 0 the lowest */
export function registerNumber(midi: Midi): number {
  const index = Math.floor((midi - C0 + QUARTER_TONE) / 12);
  return Math.min(Math.max(index, 0), REGISTERS.length - 1);
}
