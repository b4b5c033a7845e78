/** Number types of NPY files: the ones that are read, and the names of the others for refusals. */

import { DataError } from "../scoring/data-error";

import type { PythonValue } from "./python-literal";

/**
 * How one value of an array is stored.
 *
 * @example const type: NumberType = { name: "float64", itemBytes: 8, isLittleEndian: true, isComplex: false }
 */
export interface NumberType {
  name: "float64" | "float32" | "complex128" | "complex64" | "int32" | "int64";
  itemBytes: number;
  isLittleEndian: boolean;
  isComplex: boolean;
}

const readNames: Record<string, NumberType["name"]> = {
  f8: "float64",
  f4: "float32",
  c16: "complex128",
  c8: "complex64",
  i4: "int32",
  i8: "int64",
};

const remedy =
  'Read are float64, float32, complex128, complex64, int32 and int64: convert with u.astype("float64").';

/**
 * Reads the `descr` entry of an NPY header.
 *
 * @param descr value of the entry
 * @param firstByte byte offset of the header's text, for refusals
 * @returns the number type with its byte order
 * @throws DataError `format/number-type` naming the type and its byte offset; `format/pickle` for object
 *   arrays, whose content is a pickle that is never opened
 * @example readNumberType({ kind: "string", text: "<f8", at: 10 }, 10).name // "float64"
 * @see https://numpy.org/doc/stable/reference/arrays.interface.html#object.__array_interface__ (typestr)
 */
export function readNumberType(descr: PythonValue, firstByte: number): NumberType {
  const where = `byte ${firstByte + descr.at}`;
  if (descr.kind === "list" || descr.kind === "tuple") {
    throw new DataError(
      "format/number-type",
      `The array is a structured array (several named fields in one value), at ${where}. Write each field as ` +
        `an array of its own with numpy.savez. ${remedy}`,
      where,
    );
  }
  const match = descr.kind === "string" ? /^([<>|=])([A-Za-z?])(\d*)/.exec(descr.text) : null;
  if (descr.kind !== "string" || match === null) {
    const found = descr.kind === "string" ? JSON.stringify(descr.text) : `a ${descr.kind}`;
    throw new DataError(
      "format/bad-header",
      `The number type is ${found} at ${where}, expected was a string such as '<f8'. ${remedy}`,
      where,
    );
  }
  const [, order, letter, size] = match;
  if (letter === "O") {
    throw new DataError(
      "format/pickle",
      `The array is an object array, stored as a Python pickle, at ${where}. A pickle can run code and is ` +
        `never opened. ${remedy}`,
      where,
    );
  }
  const name = (order === "<" || order === ">") && readNames[descr.text.slice(1)];
  if (!name) {
    throw new DataError(
      "format/number-type",
      `The array holds ${nameOfRefused(letter, size)} (${JSON.stringify(descr.text)}) at ${where}. ${remedy}`,
      where,
    );
  }
  return { name, itemBytes: Number(size), isLittleEndian: order === "<", isComplex: letter === "c" };
}

function nameOfRefused(letter: string, size: string): string {
  const bits = 8 * Number(size);
  switch (letter) {
    case "b":
    case "?":
      return "boolean values";
    case "S":
    case "a":
      return "strings of bytes";
    case "U":
      return "strings";
    case "V":
      return "structured values";
    case "M":
    case "m":
      return "dates or time spans";
    case "f":
      return `float${bits} values`;
    case "c":
      return `complex${bits} values`;
    case "i":
      return `int${bits} values`;
    case "u":
      return `uint${bits} values`;
    default:
      return "values of an unknown type";
  }
}
