import type { InstrumentBody } from '#shared/data/instrument-bodies';
import { INSTRUMENT_BODIES } from '#shared/data/instrument-bodies';
import type { Instrument } from '#shared/strings/sections';
import type { Decibels, Hertz } from '#shared/units';

/** The shape of the bumps and slopes: from memory, but for the hill's height (Saitis et al. 2012: 7 ± 2 dB). */
const MODE_GAIN_DB = 3;
const MODE_WIDTH_OCTAVES = 0.2;
const HILL_GAIN_DB = 6;
const HILL_WIDTH_OCTAVES = 0.5;
const LOW_PASS_HZ = 4000;
/** Two poles: the power falls with the fourth power of the frequency. */
const SECOND_ORDER = 4;
const TILT_EXPONENT = -0.2;
const TILT_HZ = 1000;
const DB_PER_AMPLITUDE_DECADE = 20;
const DB_PER_POWER_DECADE = 10;

/**
 * Gain of an instrument's body at a frequency: second-order high-pass at the air mode, bumps at the air mode
 * and the two wood modes, the bridge hill, second-order low-pass at 4 kHz and a gentle tilt.
 * @param frequencyHz above 0
 * @returns decibels
 * @source shared/data/instrument-bodies for the modes; shape as above, from memory
 * @example bodyGain('cello', 65.4) < bodyGain('cello', 175) // true: weak fundamentals on the C string
 */
export function bodyGain(instrument: Instrument, frequencyHz: Hertz): Decibels {
  const body = INSTRUMENT_BODIES[instrument];
  return (
    roll(body.airHz / frequencyHz) +
    roll(frequencyHz / LOW_PASS_HZ) +
    modes(body, frequencyHz) +
    DB_PER_AMPLITUDE_DECADE * TILT_EXPONENT * Math.log10(frequencyHz / TILT_HZ)
  );
}

function modes({ airHz, woodHz, hillHz }: InstrumentBody, frequencyHz: Hertz): Decibels {
  const bumps =
    bump(frequencyHz / airHz, MODE_WIDTH_OCTAVES) +
    bump(frequencyHz / woodHz[0], MODE_WIDTH_OCTAVES) +
    bump(frequencyHz / woodHz[1], MODE_WIDTH_OCTAVES);
  return MODE_GAIN_DB * bumps + HILL_GAIN_DB * bump(frequencyHz / hillHz, HILL_WIDTH_OCTAVES);
}

function bump(ratio: number, widthOctaves: number): number {
  return Math.exp(-((Math.log2(ratio) / widthOctaves) ** 2) / 2);
}

function roll(ratio: number): Decibels {
  return -DB_PER_POWER_DECADE * Math.log10(1 + ratio ** SECOND_ORDER);
}
