const FIRST_MS = 2000;
const LONGEST_MS = 15_000;

/**
 * How long to wait before asking again: doubled each time, a quarter of a minute at most; common practice.
 * @param failures in a row, from 1
 * @returns milliseconds
 * @example retryDelayMs(3) // 8000
 */
export function retryDelayMs(failures: number): number {
  return Math.min(FIRST_MS * 2 ** (failures - 1), LONGEST_MS);
}
