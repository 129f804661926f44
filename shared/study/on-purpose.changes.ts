import type { Chord } from '#shared/study/study.document';
import type { Register } from '#shared/voicing/registers';
import { REGISTERS } from '#shared/voicing/registers';

/** What is meant to cloud: the whole chord, or one register of it. */
export type Purpose = 'chord' | Register;

/** @returns the chord with a mark that it, or one register of it, clouds on purpose, or without that mark */
export function setOnPurpose(chord: Chord, purpose: Purpose, meant: boolean): Chord {
  const { registers } = chord.onPurpose;
  if (purpose === 'chord') return { ...chord, onPurpose: { registers, chord: meant } };
  const marked = REGISTERS.filter((register) =>
    register === purpose ? meant : registers.includes(register),
  );
  return { ...chord, onPurpose: { ...chord.onPurpose, registers: marked } };
}

/**
 * @param register the chord's cloudiest, to which its figure belongs; null where nothing clouds
 * @returns what of a chord's clouding is meant, as far as its figure goes; null where none is
 */
export function purposeOf(
  { onPurpose }: Pick<Chord, 'onPurpose'>,
  register: Register | null,
): Purpose | null {
  if (onPurpose.chord) return 'chord';
  return register !== null && onPurpose.registers.includes(register) ? register : null;
}
