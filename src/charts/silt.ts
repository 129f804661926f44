/** The marks of the ramp from clear to silt, each a colour token. */
const MARKS = [0, 25, 50, 75, 100] as const;
const STEP = 25;

/**
 * The colour of a muddiness on the one ramp that means it.
 * @param index 0 … 100; beyond, the ramp's end
 * @returns a colour for a style, between the two nearest marks
 * @example siltColour(50) // 'var(--silt-50)'
 */
export function siltColour(index: number): string {
  const within = Math.min(Math.max(index, 0), 100);
  const place = Math.floor(within / STEP);
  const [lower, upper] = [MARKS[place] ?? 100, MARKS[place + 1] ?? 100];
  const share = Math.round(((within - lower) / STEP) * 100);
  return share === 0
    ? `var(--silt-${lower})`
    : `color-mix(in oklab, var(--silt-${upper}) ${share}%, var(--silt-${lower}))`;
}
