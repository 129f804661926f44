import type { Purpose } from '#shared/study/on-purpose.changes';
import { registerName, sentence } from '#shared/voicing/words';

/** @returns what is meant, as it stands in a sentence: `the great octave` */
export function purposeName(purpose: Purpose): string {
  return purpose === 'chord' ? 'the chord' : registerName(purpose);
}

/** @returns `The great octave clouds on purpose.` */
export function purposeText(purpose: Purpose): string {
  return sentence(`${purposeName(purpose)} clouds on purpose.`);
}
