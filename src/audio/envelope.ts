import type { Technique } from '#shared/study/study.document';
import type { Midi } from '#shared/units';

/** How a note begins and ends; all times in seconds. */
export interface Envelope {
  readonly attack: number;
  /** Time in which the level falls by 60 dB while the note lasts; null where it is sustained. */
  readonly decay: number | null;
  readonly release: number;
}

/** E1, the lowest open string of the double bass. */
const LOWEST_STRING: Midi = 28;

/**
 * A long, heavy string speaks more slowly than a short one: from an eighth of a second at the bottom, half as
 * long four octaves higher.
 * @source orders of magnitude from memory; within the usual bounds of a soft onset without a click
 */
const BOWED = { attack: 0.13, octavesToHalf: 4, release: 0.16 } as const;
/**
 * A plucked string sounds at once and dies away, a low one slowly: by 60 dB in about two and a half seconds at
 * the bottom, half of it two octaves higher.
 * @source orders of magnitude from memory
 */
const PLUCKED = { attack: 0.006, decay: 2.6, octavesToHalf: 2, release: 0.12 } as const;

/** From one held note to the next while a note is dragged: short, and still no click. */
export const CROSSFADE: Envelope = { attack: 0.03, decay: null, release: 0.03 };

function shortened(seconds: number, midi: Midi, octavesToHalf: number): number {
  return seconds * 2 ** (-Math.max(midi - LOWEST_STRING, 0) / (12 * octavesToHalf));
}

/**
 * @param midi the sounding pitch
 * @returns how a note of this technique begins and ends
 * @example envelopeOf({ contact: 'ordinary', mute: false, stroke: 'sustained', harmonic: 'none' }, 28).attack // 0.13
 */
export function envelopeOf({ stroke }: Technique, midi: Midi): Envelope {
  if (stroke === 'pizzicato') {
    const { attack, decay, octavesToHalf, release } = PLUCKED;
    return { attack, decay: shortened(decay, midi, octavesToHalf), release };
  }
  const { attack, octavesToHalf, release } = BOWED;
  return { attack: shortened(attack, midi, octavesToHalf), decay: null, release };
}
