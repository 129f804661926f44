import type { Instrument } from '#shared/strings/sections';
import type { Hertz } from '#shared/units';

/** Where an instrument's body helps the sound most. */
export interface InstrumentBody {
  /** The air mode: below it the body radiates little. */
  readonly airHz: Hertz;
  /** The two main modes of the wood. */
  readonly woodHz: readonly [Hertz, Hertz];
  /** The bridge hill. */
  readonly hillHz: Hertz;
}

export const INSTRUMENT_BODIES_SOURCE =
  'Violin: Saitis et al. 2012 (SFA/CFA Nantes), bridge admittance, peaks at 273, 410, 495 and 557 Hz, hill ' +
  '2.0–3.5 kHz; C. M. Hutchins 1967, main resonance 440 ± 26 Hz. Viola and cello: Hutchins 1967 (both main ' +
  'resonances three to four semitones above the two open middle strings). The rest from memory of the general ' +
  'literature (Askenfelt 1982, Jansson).';

/** @source see {@link INSTRUMENT_BODIES_SOURCE} */
export const INSTRUMENT_BODIES: Readonly<Record<Instrument, InstrumentBody>> = {
  violin: { airHz: 275, woodHz: [460, 550], hillHz: 2500 },
  viola: { airHz: 225, woodHz: [357, 403], hillHz: 2000 },
  cello: { airHz: 100, woodHz: [175, 220], hillHz: 1750 },
  doubleBass: { airHz: 62, woodHz: [100, 130], hillHz: 1250 },
};
