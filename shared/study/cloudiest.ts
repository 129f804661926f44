/**
 * @param indices of a study's chords, `null` for one that is not worked out yet
 * @returns the largest, which is how the study is summed up; `null` until all are known
 * @example cloudiest([12, 58, 40]) // 58
 */
export function cloudiest(indices: readonly (number | null)[]): number | null {
  const known = indices.filter((index) => index !== null);
  return known.length < indices.length || known.length === 0 ? null : Math.max(...known);
}
