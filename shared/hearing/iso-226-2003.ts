import type { LoudnessBand } from '#shared/data/equal-loudness';
import { LOUDNESS_BANDS } from '#shared/data/equal-loudness';
import type { Decibels, Hertz } from '#shared/units';

const SCALE = 4.47e-3;
const PHON_RATE = 0.025;
const PHON_OFFSET = 1.15;
const THRESHOLD_SCALE = 0.4;
const THRESHOLD_OFFSET = 9;
const REFERENCE_DB = 94;
const DB_PER_POWER_DECADE = 10;

/**
 * The equal-loudness contour: the level that a pure tone needs to be as loud as a 1 kHz tone.
 * @param phon loudness level, 20 to 90 in the standard's range
 * @param frequencyHz between the table's frequencies the parameters are interpolated on the logarithm
 * @returns dB SPL
 * @throws RangeError outside 20 Hz to 12.5 kHz
 * @source ISO 226:2003, eq. 1 and 2
 * @example levelOfPhon(20, 40) // 69.6
 */
export function levelOfPhon(phon: number, frequencyHz: Hertz): Decibels {
  const { alpha, transferDb, thresholdDb } = parametersAt(frequencyHz);
  const a =
    SCALE * (DB_PER_POWER_DECADE ** (PHON_RATE * phon) - PHON_OFFSET) +
    thresholdTerm(alpha, transferDb, thresholdDb);
  return (DB_PER_POWER_DECADE / alpha) * Math.log10(a) - transferDb + REFERENCE_DB;
}

/**
 * The loudness level of a pure tone, the inverse of {@link levelOfPhon}.
 * @returns phon; minus infinity where the tone lies so far under the threshold that it has none
 * @throws RangeError outside 20 Hz to 12.5 kHz
 * @source ISO 226:2003
 */
export function phonOfLevel(level: Decibels, frequencyHz: Hertz): number {
  const { alpha, transferDb, thresholdDb } = parametersAt(frequencyHz);
  const a = 10 ** ((alpha * (level + transferDb - REFERENCE_DB)) / DB_PER_POWER_DECADE);
  const inside = (a - thresholdTerm(alpha, transferDb, thresholdDb)) / SCALE + PHON_OFFSET;
  return inside > 0 ? Math.log10(inside) / PHON_RATE : -Infinity;
}

function thresholdTerm(alpha: number, transferDb: Decibels, thresholdDb: Decibels): number {
  return (
    (THRESHOLD_SCALE * 10 ** ((thresholdDb + transferDb) / DB_PER_POWER_DECADE - THRESHOLD_OFFSET)) ** alpha
  );
}

function parametersAt(frequencyHz: Hertz): LoudnessBand {
  const upper = LOUDNESS_BANDS.findIndex((band) => band.frequencyHz >= frequencyHz);
  const above = LOUDNESS_BANDS[upper];
  const below = LOUDNESS_BANDS[Math.max(upper - 1, 0)];
  if (!above || !below || frequencyHz < below.frequencyHz) {
    throw new RangeError(`the contours run from 20 Hz to 12.5 kHz: ${frequencyHz}`);
  }
  if (above === below) return above;
  const way = Math.log(frequencyHz / below.frequencyHz) / Math.log(above.frequencyHz / below.frequencyHz);
  const between = (a: number, b: number) => a + way * (b - a);
  return {
    frequencyHz,
    alpha: between(below.alpha, above.alpha),
    transferDb: between(below.transferDb, above.transferDb),
    thresholdDb: between(below.thresholdDb, above.thresholdDb),
  };
}
