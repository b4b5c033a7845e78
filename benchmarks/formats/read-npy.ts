/** Reads NPY files, the format of numpy.save. */

import { DataError } from "../scoring/data-error";

import { convertValues } from "./convert-values";
import { defaultLimits, type FieldArray, type ReadLimits } from "./field-file";
import { readNpyHeader, type NpyHeader } from "./npy-header";
import { undoFortranOrder } from "./row-major";

/**
 * Reads one array from the bytes of an NPY file.
 *
 * The header is checked against the limits before anything of its size is allocated, and the file's length
 * must be exactly what the header promises. Values may be NaN or infinite: the scorer refuses those.
 *
 * @param bytes the whole file
 * @param limits what may be allocated
 * @returns the array, row-major, in double precision; no view of `bytes`
 * @throws DataError `format/bad-magic`, `format/bad-version`, `format/bad-header`, `format/number-type`,
 *   `format/pickle`, `format/truncated`, `format/trailing-bytes`, `format/too-many-values`,
 *   `format/too-large` or `values/not-exact`, naming the byte offset
 * @example const { shape, values } = readNpy(await readFile("n64.npy"))
 * @see https://numpy.org/doc/stable/reference/generated/numpy.lib.format.html
 */
export function readNpy(bytes: Uint8Array, limits: ReadLimits = defaultLimits): FieldArray {
  const header = readNpyHeader(bytes);
  checkLimits(header, limits);
  checkLength(header, bytes.length);
  const { type, shape, isFortranOrder } = header;
  const { values, imaginary } = convertValues(bytes, header.dataAt, header.count, type);
  return {
    shape,
    values: isFortranOrder ? undoFortranOrder(values, shape) : values,
    imaginary: imaginary && isFortranOrder ? undoFortranOrder(imaginary, shape) : imaginary,
    numberType: type.name,
    isFortranOrder,
  };
}

function checkLimits({ count, shape, shapeAt, type }: NpyHeader, limits: ReadLimits): void {
  const where = `byte ${shapeAt}`;
  if (count > limits.maxNodes) {
    throw new DataError(
      "format/too-many-values",
      `The header claims the shape (${shape.join(", ")}) at ${where}, which is ${count} values. At most ` +
        `${limits.maxNodes} values are read from one array.`,
      where,
    );
  }
  const doubleBytes = count * (type.isComplex ? 16 : 8);
  if (doubleBytes > limits.maxUnpackedBytes) {
    throw new DataError(
      "format/too-large",
      `The header claims the shape (${shape.join(", ")}) at ${where}, which takes ${doubleBytes} bytes in ` +
        `double precision. At most ${limits.maxUnpackedBytes} bytes are unpacked from one file.`,
      where,
    );
  }
}

function checkLength({ count, shape, type, dataAt }: NpyHeader, length: number): void {
  const expected = dataAt + count * type.itemBytes;
  if (length === expected) return;
  const promise = `The header promises the shape (${shape.join(", ")}) of ${type.name}, which ends at byte ${expected}`;
  if (length < expected) {
    throw new DataError(
      "format/truncated",
      `${promise}, but the file ends at byte ${length}. Send the whole file.`,
      `byte ${length}`,
    );
  }
  throw new DataError(
    "format/trailing-bytes",
    `${promise}, but ${length - expected} more bytes follow. Write one array a file, or several with numpy.savez.`,
    `byte ${expected}`,
  );
}
