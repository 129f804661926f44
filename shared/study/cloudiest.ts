/**
 * @param indices of a study's chords, as far as they are known
 * @returns the largest, which is how the study is summed up; `null` while none is known
 * @example cloudiest([12, 58, 40]) // 58
 */
export function cloudiest(indices: readonly number[]): number | null {
  return indices.length === 0 ? null : Math.max(...indices);
}
