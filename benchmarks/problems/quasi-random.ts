/**
 * Points that fill the unit cube evenly: an additive recurrence with the generalised golden ratio.
 *
 * @param count how many points
 * @param dimension 1 to 3
 * @returns `count` points of `dimension` coordinates in (0, 1)
 * @example quasiRandomPoints(2, 1) // [[0.118...], [0.736...]]
 * @see M. Roberts, The unreasonable effectiveness of quasirandom sequences, 2018 (from memory)
 */
export function quasiRandomPoints(count: number, dimension: number): number[][] {
  let ratio = 1.5;
  for (let step = 0; step < 60; step++) ratio = Math.pow(1 + ratio, 1 / (dimension + 1));
  const steps = Array.from({ length: dimension }, (_, axis) => Math.pow(ratio, -(axis + 1)));
  return Array.from({ length: count }, (_, k) => steps.map((step) => (0.5 + (k + 1) * step) % 1));
}
