/** Writes NPZ files as numpy.savez does: a zip archive of stored NPY files. */

import { zipSync, type Zippable } from "fflate";

import { writeNpy, type ArrayToWrite } from "./write-npy";

// Zip keeps no earlier time than this; a fixed one gives the same bytes, and so the same checksum, every time.
const writtenAt = new Date(1980, 0, 1);

/**
 * Writes named arrays as an NPZ file, not compressed.
 *
 * @param arrays arrays by name, written in this order
 * @returns the file's bytes, the same for the same arrays
 * @throws RangeError where the number of values of an array differs from its shape's product
 * @example writeNpz({ x: { shape: [64], values: x }, u: { shape: [64], values: u } })
 * @see https://numpy.org/doc/stable/reference/generated/numpy.savez.html
 */
export function writeNpz(arrays: Record<string, ArrayToWrite>): Uint8Array {
  const entries: Zippable = {};
  for (const [name, array] of Object.entries(arrays)) {
    entries[`${name}.npy`] = [writeNpy(array), { level: 0, mtime: writtenAt }];
  }
  return zipSync(entries);
}
