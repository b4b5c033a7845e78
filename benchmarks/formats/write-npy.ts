/** Writes NPY files as NumPy does. */

import { npyMagic } from "./npy-header";

/**
 * An array to be written: row-major, real or complex.
 *
 * @example const array: ArrayToWrite = { shape: [2], values: Float64Array.of(1, 2) }
 */
export interface ArrayToWrite {
  shape: readonly number[];
  values: Float64Array;
  imaginary?: Float64Array | null;
}

const alignment = 64;

/**
 * Writes an array as an NPY file of version 1.0, little-endian float64 or complex128, in C order.
 *
 * @param array shape and values
 * @returns the file's bytes, the same that numpy.save would write
 * @throws RangeError where the number of values differs from the shape's product
 * @example await writeFile("u.npy", writeNpy({ shape: [64], values: u }))
 * @see https://numpy.org/doc/stable/reference/generated/numpy.lib.format.html
 */
export function writeNpy({ shape, values, imaginary = null }: ArrayToWrite): Uint8Array {
  const count = shape.reduce((product, length) => product * length, 1);
  if (values.length !== count || (imaginary !== null && imaginary.length !== count)) {
    throw new RangeError(`${values.length} values do not fill the shape (${shape.join(", ")})`);
  }
  const tuple = shape.length === 1 ? `(${shape[0]},)` : `(${shape.join(", ")})`;
  const dict = `{'descr': '${imaginary ? "<c16" : "<f8"}', 'fortran_order': False, 'shape': ${tuple}, }`;
  const dataAt = Math.ceil((10 + dict.length + 1) / alignment) * alignment;
  const text = `${dict.padEnd(dataAt - 11)}\n`;

  const bytes = new Uint8Array(dataAt + count * (imaginary ? 16 : 8));
  bytes.set(npyMagic);
  bytes[6] = 1;
  const view = new DataView(bytes.buffer);
  view.setUint16(8, text.length, true);
  bytes.set(new TextEncoder().encode(text), 10);
  const step = imaginary ? 16 : 8;
  for (let i = 0; i < count; i++) {
    view.setFloat64(dataAt + step * i, values[i], true);
    if (imaginary) view.setFloat64(dataAt + step * i + 8, imaginary[i], true);
  }
  return bytes;
}
