/** NaN and infinity in submitted arrays. */

/**
 * Finds values that are NaN or infinite.
 *
 * @returns the first index and how many there are, or null where every value is finite
 * @example findNonFinite(Float64Array.of(1, NaN)) // { index: 1, count: 1 }
 * @see IEEE 754-2019, section 6
 */
export function findNonFinite(values: Float64Array): { index: number; count: number } | null {
  // x - x is 0 for every finite x and NaN otherwise, so a sum of them tells without a branch per value.
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += values[i] - values[i];
  if (sum === 0) return null;
  let index = -1;
  let count = 0;
  for (let i = 0; i < values.length; i++) {
    if (Number.isFinite(values[i])) continue;
    if (index < 0) index = i;
    count++;
  }
  return { index, count };
}
