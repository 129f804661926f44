/** From linear sRGB to cone responses, from these to Oklab, and back. @source Björn Ottosson: A perceptual color space for image processing (2020) */
const TO_CONES = [
  [0.4122214708, 0.5363325363, 0.0514459929],
  [0.2119034982, 0.6806995451, 0.1073969566],
  [0.0883024619, 0.2817188376, 0.6299787005],
] as const;
const FROM_CONES = [
  [4.0767416621, -3.3077115913, 0.2309699292],
  [-1.2684380046, 2.6097574011, -0.3413193965],
  [-0.0041960863, -0.7034186147, 1.707614701],
] as const;
/** sRGB's transfer curve. @source IEC 61966-2-1 */
const [TOE, TOE_SLOPE, SCALE, GAMMA] = [0.0031308, 12.92, 1.055, 2.4] as const;
const FULL = 255;
const HEX = 16;
const PAIR = 2;

type Triple = readonly [number, number, number];
type Matrix = readonly [Triple, Triple, Triple];

function times(matrix: Matrix, [a, b, c]: Triple): Triple {
  const row = ([x, y, z]: Triple): number => x * a + y * b + z * c;
  return [row(matrix[0]), row(matrix[1]), row(matrix[2])];
}

function linear(part: number): number {
  return part <= TOE * TOE_SLOPE ? part / TOE_SLOPE : ((part + SCALE - 1) / SCALE) ** GAMMA;
}

function encoded(light: number): number {
  const within = Math.min(Math.max(light, 0), 1);
  return within <= TOE ? within * TOE_SLOPE : SCALE * within ** (1 / GAMMA) - (SCALE - 1);
}

/** The cube roots of the cones' responses, of which Oklab is a linear map: mixing them is mixing in Oklab. */
function roots(hex: string): Triple {
  const part = (at: number): number =>
    linear(Number.parseInt(hex.slice(1 + at * PAIR, 1 + (at + 1) * PAIR), HEX) / FULL);
  const [l, m, s] = times(TO_CONES, [part(0), part(1), part(2)]);
  return [Math.cbrt(l), Math.cbrt(m), Math.cbrt(s)];
}

/**
 * Mixes two colours as the page's `color-mix(in oklab, …)` does, for files that know no such function.
 * @param a as `#rrggbb`
 * @param b as `#rrggbb`
 * @param share of `b`, 0 … 1
 * @returns the mixture as `#rrggbb`
 * @example mixOklab('#000000', '#ffffff', 0.5) // '#636363'
 */
export function mixOklab(a: string, b: string, share: number): string {
  const [from, to] = [roots(a), roots(b)];
  const cone = (at: 0 | 1 | 2): number => (from[at] + (to[at] - from[at]) * share) ** 3;
  const light = times(FROM_CONES, [cone(0), cone(1), cone(2)]);
  const digits = light.map((part) =>
    Math.round(encoded(part) * FULL)
      .toString(HEX)
      .padStart(PAIR, '0'),
  );
  return `#${digits.join('')}`;
}
