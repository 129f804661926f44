import type { Decibels, Hertz } from '#shared/units';

/** One line of the standard's table. */
export interface LoudnessBand {
  readonly frequencyHz: Hertz;
  /** Exponent of loudness perception. */
  readonly alpha: number;
  /** Magnitude of the linear transfer function, normalised at 1 kHz. */
  readonly transferDb: Decibels;
  /** Threshold of hearing, dB SPL. */
  readonly thresholdDb: Decibels;
}

function band(frequencyHz: Hertz, alpha: number, transferDb: Decibels, thresholdDb: Decibels): LoudnessBand {
  return { frequencyHz, alpha, transferDb, thresholdDb };
}

/** @source ISO 226:2003, table 1 */
export const LOUDNESS_BANDS: readonly LoudnessBand[] = [
  band(20, 0.532, -31.6, 78.5),
  band(25, 0.506, -27.2, 68.7),
  band(31.5, 0.48, -23, 59.5),
  band(40, 0.455, -19.1, 51.1),
  band(50, 0.432, -15.9, 44),
  band(63, 0.409, -13, 37.5),
  band(80, 0.387, -10.3, 31.5),
  band(100, 0.367, -8.1, 26.5),
  band(125, 0.349, -6.2, 22.1),
  band(160, 0.33, -4.5, 17.9),
  band(200, 0.315, -3.1, 14.4),
  band(250, 0.301, -2, 11.4),
  band(315, 0.288, -1.1, 8.6),
  band(400, 0.276, -0.4, 6.2),
  band(500, 0.267, 0, 4.4),
  band(630, 0.259, 0.3, 3),
  band(800, 0.253, 0.5, 2.2),
  band(1000, 0.25, 0, 2.4),
  band(1250, 0.246, -2.7, 3.5),
  band(1600, 0.244, -4.1, 1.7),
  band(2000, 0.243, -1, -1.3),
  band(2500, 0.243, 1.7, -4.2),
  band(3150, 0.243, 2.5, -6),
  band(4000, 0.242, 1.2, -5.4),
  band(5000, 0.242, -2.1, -1.5),
  band(6300, 0.245, -7.1, 6),
  band(8000, 0.254, -11.2, 12.6),
  band(10000, 0.271, -10.7, 13.9),
  band(12500, 0.301, -3.1, 12.3),
];
