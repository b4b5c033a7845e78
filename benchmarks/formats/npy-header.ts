/** Headers of NPY files: magic, format version, and the dictionary of type, order and shape. */

import { DataError } from "../scoring/data-error";

import { readNumberType, type NumberType } from "./number-type";
import { parsePythonLiteral, type PythonValue } from "./python-literal";

/**
 * What the header of an NPY file states.
 *
 * @example const header: NpyHeader = readNpyHeader(bytes)
 */
export interface NpyHeader {
  type: NumberType;
  isFortranOrder: boolean;
  shape: number[];
  /** Product of the shape. May exceed what can be allocated: check it first. */
  count: number;
  /** Byte offset of the shape, for refusals. */
  shapeAt: number;
  /** Byte offset of the first value. */
  dataAt: number;
}

/**
 * The first bytes of every NPY file: 0x93 and NUMPY.
 *
 * @example startsWithNpyMagic(Uint8Array.of(0x93, 0x4e, 0x55, 0x4d, 0x50, 0x59)) // true
 */
export const npyMagic: readonly number[] = [0x93, 0x4e, 0x55, 0x4d, 0x50, 0x59];

const maxHeaderBytes = 65536;
const maxAxes = 8;

/**
 * Tells whether the bytes begin like an NPY file.
 *
 * @param bytes the file
 * @returns true where the six bytes of the magic are there
 * @example startsWithNpyMagic(new Uint8Array(0)) // false
 */
export function startsWithNpyMagic(bytes: Uint8Array): boolean {
  return npyMagic.every((byte, index) => bytes[index] === byte);
}

/**
 * Reads the header of an NPY file of format version 1.0, 2.0 or 3.0.
 *
 * @param bytes the whole file
 * @returns the header; nothing of the data is looked at
 * @throws DataError `format/bad-magic`, `format/bad-version`, `format/truncated`, `format/bad-header`,
 *   `format/number-type` or `format/pickle`, naming the byte offset
 * @example readNpyHeader(writeNpy({ shape: [2], values: Float64Array.of(1, 2) })).shape // [2]
 * @see https://numpy.org/doc/stable/reference/generated/numpy.lib.format.html
 */
export function readNpyHeader(bytes: Uint8Array): NpyHeader {
  const { textAt, dataAt } = findHeaderText(bytes);
  // Version 3.0 is UTF-8: beyond ASCII it holds only field names of structured arrays, which are refused.
  // One character a byte keeps positions and byte offsets the same.
  let text = "";
  for (let i = textAt; i < dataAt; i++) text += String.fromCharCode(bytes[i]);
  const value = parsePythonLiteral(text, textAt);
  if (value.kind !== "dict") {
    throw badHeader(`The header holds a ${value.kind}, expected was a dictionary`, textAt + value.at);
  }
  for (const [key, entry] of value.entries) {
    if (key !== "descr" && key !== "fortran_order" && key !== "shape") {
      throw badHeader(`The header has the unknown entry ${JSON.stringify(key)}`, textAt + entry.at);
    }
  }
  const type = readNumberType(entryOf(value.entries, "descr", textAt), textAt);
  const order = entryOf(value.entries, "fortran_order", textAt);
  if (order.kind !== "boolean") {
    throw badHeader(`fortran_order is a ${order.kind}, expected was True or False`, textAt + order.at);
  }
  const shapeEntry = entryOf(value.entries, "shape", textAt);
  const shape = readShape(shapeEntry, textAt);
  const count = shape.reduce((product, length) => product * length, 1);
  return { type, isFortranOrder: order.value, shape, count, shapeAt: textAt + shapeEntry.at, dataAt };
}

function findHeaderText(bytes: Uint8Array): { textAt: number; dataAt: number } {
  const wrong = npyMagic.findIndex((byte, index) => index < bytes.length && bytes[index] !== byte);
  if (wrong >= 0) {
    const found = bytes[wrong].toString(16).padStart(2, "0");
    const expected = npyMagic[wrong].toString(16);
    throw new DataError(
      "format/bad-magic",
      `This is not an NPY file: byte ${wrong} is 0x${found}, expected was 0x${expected}. Write the file with ` +
        "numpy.save.",
      `byte ${wrong}`,
    );
  }
  if (bytes.length < 10) throw endsInHeader(bytes.length, 10);
  const [major, minor] = [bytes[6], bytes[7]];
  if (major < 1 || major > 3 || minor !== 0) {
    throw new DataError(
      "format/bad-version",
      `The NPY format version is ${major}.${minor} at byte 6. Versions 1.0, 2.0 and 3.0 are read: write the ` +
        "file with numpy.save.",
      "byte 6",
    );
  }
  const textAt = major === 1 ? 10 : 12;
  if (bytes.length < textAt) throw endsInHeader(bytes.length, textAt);
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const length = major === 1 ? view.getUint16(8, true) : view.getUint32(8, true);
  if (length > maxHeaderBytes) {
    throw badHeader(`The header claims to be ${length} bytes long, at most ${maxHeaderBytes} are read`, 8);
  }
  if (bytes.length < textAt + length) throw endsInHeader(bytes.length, textAt + length);
  return { textAt, dataAt: textAt + length };
}

function readShape(entry: PythonValue, textAt: number): number[] {
  if (entry.kind !== "tuple") {
    throw badHeader(`The shape is a ${entry.kind}, expected was a tuple such as (64,)`, textAt + entry.at);
  }
  if (entry.items.length > maxAxes) {
    throw badHeader(
      `The shape has ${entry.items.length} axes, at most ${maxAxes} are read`,
      textAt + entry.at,
    );
  }
  return entry.items.map((item) => {
    if (item.kind !== "integer" || item.value < 0 || !Number.isSafeInteger(item.value)) {
      const found = item.kind === "integer" ? String(item.value) : `a ${item.kind}`;
      throw badHeader(`A length in the shape is ${found}, expected was a whole number`, textAt + item.at);
    }
    return item.value;
  });
}

function entryOf(entries: Map<string, PythonValue>, key: string, textAt: number): PythonValue {
  const entry = entries.get(key);
  if (entry === undefined) throw badHeader(`The header lacks the entry ${JSON.stringify(key)}`, textAt);
  return entry;
}

function badHeader(found: string, byte: number): DataError {
  return new DataError(
    "format/bad-header",
    `${found} (byte ${byte}). Write the file with numpy.save or numpy.savez.`,
    `byte ${byte}`,
  );
}

function endsInHeader(length: number, needed: number): DataError {
  return new DataError(
    "format/truncated",
    `The file ends at byte ${length} within the NPY header, which needs ${needed} bytes. Send the whole file.`,
    `byte ${length}`,
  );
}
