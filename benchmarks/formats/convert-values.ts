/** Stored bytes into double precision: both byte orders, real and complex numbers, whole numbers exactly. */

import { DataError } from "../scoring/data-error";

import { isHostLittleEndian } from "./host-byte-order";
import type { NumberType } from "./number-type";

const twoTo32 = 2 ** 32;
const twoTo21 = 2 ** 21;

/**
 * Converts `count` stored values to double precision, in the order of the file.
 *
 * float32 and int32 are converted exactly; int64 exactly or refused beyond 2^53.
 *
 * @param bytes the file; long enough for all values
 * @param start byte offset of the first value
 * @param count number of values, complex ones counted once
 * @param type how a value is stored
 * @returns real parts, and imaginary parts or null; arrays of their own, never views of the file
 * @throws DataError `values/not-exact` where a whole number exceeds 2^53, with its index and byte offset
 * @throws RangeError where the bytes do not hold that many values
 * @example convertValues(Uint8Array.of(0, 0, 0, 7), 0, 1, { name: "int32", itemBytes: 4, isLittleEndian: false, isComplex: false })
 * @see IEEE Std 754-2019, 5.4.1 (widening conversions are exact)
 */
export function convertValues(
  bytes: Uint8Array,
  start: number,
  count: number,
  type: NumberType,
): { values: Float64Array; imaginary: Float64Array | null } {
  const length = count * type.itemBytes;
  if (start + length > bytes.length) {
    throw new RangeError(`${count} values need bytes up to ${start + length}, there are ${bytes.length}`);
  }
  if (type.name === "int64") return { values: readInt64(bytes, start, count, type), imaginary: null };
  if (type.name === "int32") return { values: readInt32(bytes, start, count, type), imaginary: null };
  const numbers = readFloats(bytes, start, length, type);
  return type.isComplex ? splitComplex(numbers, count) : { values: numbers, imaginary: null };
}

function readFloats(bytes: Uint8Array, start: number, length: number, type: NumberType): Float64Array {
  const isDouble = type.name === "float64" || type.name === "complex128";
  const own = new Uint8Array(length);
  own.set(bytes.subarray(start, start + length));
  if (type.isLittleEndian !== isHostLittleEndian) swapBytes(own, isDouble ? 8 : 4);
  return isDouble ? new Float64Array(own.buffer) : new Float64Array(new Float32Array(own.buffer));
}

/** Reverses the bytes of each item in place. */
function swapBytes(bytes: Uint8Array, itemBytes: 4 | 8): void {
  const words = new Uint32Array(bytes.buffer);
  for (let i = 0; i < words.length; i++) {
    const w = words[i];
    words[i] = (w << 24) | ((w & 0xff00) << 8) | ((w >>> 8) & 0xff00) | (w >>> 24);
  }
  if (itemBytes === 4) return;
  for (let i = 0; i + 1 < words.length; i += 2) {
    const first = words[i];
    words[i] = words[i + 1];
    words[i + 1] = first;
  }
}

function splitComplex(
  numbers: Float64Array,
  count: number,
): { values: Float64Array; imaginary: Float64Array } {
  const values = new Float64Array(count);
  const imaginary = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    values[i] = numbers[2 * i];
    imaginary[i] = numbers[2 * i + 1];
  }
  return { values, imaginary };
}

function readInt32(bytes: Uint8Array, start: number, count: number, type: NumberType): Float64Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset + start);
  const values = new Float64Array(count);
  for (let i = 0; i < count; i++) values[i] = view.getInt32(4 * i, type.isLittleEndian);
  return values;
}

function readInt64(bytes: Uint8Array, start: number, count: number, type: NumberType): Float64Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset + start);
  const values = new Float64Array(count);
  const [highAt, lowAt] = type.isLittleEndian ? [4, 0] : [0, 4];
  for (let i = 0; i < count; i++) {
    const high = view.getInt32(8 * i + highAt, type.isLittleEndian);
    const low = view.getUint32(8 * i + lowAt, type.isLittleEndian);
    const isExact = (high >= -twoTo21 && high < twoTo21) || (high === twoTo21 && low === 0);
    if (!isExact) {
      const byte = start + 8 * i;
      const found = view.getBigInt64(8 * i, type.isLittleEndian);
      throw new DataError(
        "values/not-exact",
        `The whole number ${found} at index ${i} (byte ${byte}) lies beyond 2^53 and has no exact double. ` +
          'Write the field as float64: u.astype("float64").',
        `index ${i}, byte ${byte}`,
      );
    }
    values[i] = high * twoTo32 + low;
  }
  return values;
}
