/** The normal deviate of a two-sided 95 % interval. */
const NORMAL_95 = 1.959964;
/** Fisher's z has the variance 1 / (n − 3). */
const FISHER_LOSS = 3;

/**
 * @returns the arithmetic mean; 0 for no values
 * @example mean([1, 2, 6]) // 3
 */
export function mean(values: readonly number[]): number {
  return values.length === 0 ? 0 : values.reduce((sum, value) => sum + value, 0) / values.length;
}

/**
 * @returns the root of the mean of the squares
 * @example rootMeanSquare([3, 4]) // 3.5355
 */
export function rootMeanSquare(values: readonly number[]): number {
  return Math.sqrt(mean(values.map((value) => value * value)));
}

/**
 * Pearson's correlation coefficient.
 * @param xs at least two different values
 * @param ys as many
 * @example correlation([1, 2, 3], [2, 4, 6]) // 1
 */
export function correlation(xs: readonly number[], ys: readonly number[]): number {
  const meanX = mean(xs);
  const meanY = mean(ys);
  let both = 0;
  let x2 = 0;
  let y2 = 0;
  xs.forEach((x, i) => {
    const dx = x - meanX;
    const dy = (ys[i] ?? meanY) - meanY;
    both += dx * dy;
    x2 += dx * dx;
    y2 += dy * dy;
  });
  return both / Math.sqrt(x2 * y2);
}

/**
 * The 95 % confidence interval of a correlation coefficient.
 * @param n points that it was found from, more than three
 * @source R. A. Fisher's z-transformation
 * @example correlationInterval(0.5, 28) // 0.156 to 0.736
 */
export function correlationInterval(r: number, n: number): readonly [number, number] {
  const half = NORMAL_95 / Math.sqrt(n - FISHER_LOSS);
  const z = Math.atanh(r);
  return [Math.tanh(z - half), Math.tanh(z + half)];
}
