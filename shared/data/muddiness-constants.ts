import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';

export const MUDDINESS_CONSTANTS: MuddinessConstants = {
  peakErb: 0.3,
  sharpness: 1,
  reachErb: 2.2,
  fusionErb: 0.05,
  fusionStrength: 8,
  pooling: 1.5,
  floor: 0.3,
  cornerHz: 100,
  slope: 4,
  windowSemitones: 4,
  localWindowSemitones: 4,
  threshold: 0.05537,
};
