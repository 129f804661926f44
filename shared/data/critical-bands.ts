import type { Hertz } from '#shared/units';

export interface CriticalBand {
  /** The band's number, 1 the lowest. */
  readonly bark: number;
  readonly lowHz: Hertz;
  readonly centreHz: Hertz;
  readonly highHz: Hertz;
}

const EDGES: readonly Hertz[] = [
  0, 100, 200, 300, 400, 510, 630, 770, 920, 1080, 1270, 1480, 1720, 2000, 2320, 2700, 3150, 3700, 4400, 5300,
  6400, 7700, 9500, 12000, 15500,
];
const CENTRES: readonly Hertz[] = [
  50, 150, 250, 350, 450, 570, 700, 840, 1000, 1170, 1370, 1600, 1850, 2150, 2500, 2900, 3400, 4000, 4800,
  5800, 7000, 8500, 10500, 13500,
];

/**
 * The 24 critical bands.
 * @source Zwicker 1961, JASA 33: 248 (its first edge is 20 Hz, 0 in Zwicker & Fastl); bands 6, 11 and 15–17 from
 *   memory of the same table
 */
export const ZWICKER_BANDS: readonly CriticalBand[] = CENTRES.map((centreHz, index) => ({
  bark: index + 1,
  lowHz: EDGES[index] ?? 0,
  centreHz,
  highHz: EDGES[index + 1] ?? 0,
}));
