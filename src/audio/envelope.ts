import type { Technique } from '#shared/study/study.document';

/** How a note begins and ends; all times in seconds. */
export interface Envelope {
  readonly attack: number;
  /** Time in which the level falls by 60 dB while the note lasts; null where it is sustained. */
  readonly decay: number | null;
  readonly release: number;
}

/**
 * A section's bow takes hold in about a tenth of a second, a plucked string at once.
 * @source order of magnitude from memory; chosen by ear's usual bounds for a soft onset without a click
 */
const BOWED: Envelope = { attack: 0.09, decay: null, release: 0.16 };
const PLUCKED: Envelope = { attack: 0.006, decay: 1.6, release: 0.12 };

/** From one held note to the next while a note is dragged: short, and still no click. */
export const CROSSFADE: Envelope = { attack: 0.03, decay: null, release: 0.03 };

/** @returns how a note of this technique begins and ends */
export function envelopeOf(technique: Technique): Envelope {
  return technique.stroke === 'pizzicato' ? PLUCKED : BOWED;
}
