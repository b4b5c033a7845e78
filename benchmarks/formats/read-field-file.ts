/** The one door for result files: finds the format, holds the limits, reads the arrays. */

import { DataError } from "../scoring/data-error";

import { defaultLimits, type FieldFile, type ReadLimits } from "./field-file";
import { startsWithNpyMagic } from "./npy-header";
import { readNpy } from "./read-npy";
import { readNpz } from "./read-npz";
import { readTable } from "./read-table";

const formatsRead =
  "The formats that are read are NPY, NPZ, CSV and TSV: in Python numpy.savez(file, x=x, u=u), elsewhere a text " +
  "table with the header x,u.";

/** First bytes of files that solvers write and that are none of the formats. */
const strangers: { what: string; signature: number[]; at: number[] }[] = [
  // The signature may follow a user block of 512 bytes, doubled any number of times; MATLAB's has 512.
  {
    what: "an HDF5 file (also MATLAB 7.3 and NetCDF-4)",
    signature: [0x89, 0x48, 0x44, 0x46, 0x0d, 0x0a, 0x1a, 0x0a],
    at: [0, 512, 1024, 2048],
  },
  { what: "a MATLAB file", signature: [...new TextEncoder().encode("MATLAB 5.0 MAT-file")], at: [0] },
  { what: "a NetCDF file", signature: [0x43, 0x44, 0x46], at: [0] },
  { what: "a gzip file", signature: [0x1f, 0x8b], at: [0] },
];

/**
 * Reads a result file of any accepted format.
 *
 * The content decides before the name: NPY and NPZ are known by their first bytes, tables by the ending
 * `.csv` or `.tsv`. Runs in Node and in the browser; does no input or output.
 *
 * @param name the file's name as its author gave it
 * @param bytes the whole file; neither changed nor kept
 * @param limits what may be allocated
 * @returns the arrays by name, row-major, in double precision; the array of an NPY file is `u`
 * @throws DataError `format/too-large`, `format/empty`, `format/unknown`, `format/pickle` and the codes of
 *   `readNpy`, `readNpz` and `readTable`, each with its place
 * @example readFieldFile("n64.npy", bytes).arrays.get("u")?.shape // [64]
 * @see README.md, "Formats"
 */
export function readFieldFile(
  name: string,
  bytes: Uint8Array,
  limits: ReadLimits = defaultLimits,
): FieldFile {
  if (bytes.length > limits.maxBytes) {
    throw new DataError(
      "format/too-large",
      `The file is ${bytes.length} bytes long, at most ${limits.maxBytes} are read.`,
      `byte ${limits.maxBytes}`,
    );
  }
  if (bytes.length === 0)
    throw new DataError("format/empty", "The file is empty. Send the whole file.", "byte 0");
  if (startsWithNpyMagic(bytes)) return { format: "npy", arrays: new Map([["u", readNpy(bytes, limits)]]) };
  if (isZip(bytes)) return { format: "npz", arrays: readNpz(bytes, limits) };
  refuseStrangers(bytes);
  switch (/\.([^.]*)$/.exec(name)?.[1].toLowerCase()) {
    case "npy":
      return { format: "npy", arrays: new Map([["u", readNpy(bytes, limits)]]) };
    case "npz":
      throw new DataError(
        "format/bad-magic",
        `This is not an NPZ file: it does not begin with the bytes PK (byte 0). ${formatsRead}`,
        "byte 0",
      );
    case "csv":
    case "tsv":
      return { format: "csv", arrays: readTable(bytes, limits) };
    default:
      throw new DataError(
        "format/unknown",
        `Neither its first bytes nor its ending make "${name}" one of the formats. ${formatsRead}`,
        "byte 0",
      );
  }
}

/** An empty archive begins with its end record. */
function isZip(bytes: Uint8Array): boolean {
  return isAt(bytes, 0, [0x50, 0x4b, 3, 4]) || isAt(bytes, 0, [0x50, 0x4b, 5, 6]);
}

function refuseStrangers(bytes: Uint8Array): void {
  if (bytes[0] === 0x80 && bytes[1] >= 2 && bytes[1] <= 5) {
    throw new DataError(
      "format/pickle",
      `The file is a Python pickle (byte 0). A pickle can run code and is never opened. ${formatsRead}`,
      "byte 0",
    );
  }
  for (const { what, signature, at } of strangers) {
    const found = at.find((offset) => isAt(bytes, offset, signature));
    if (found === undefined) continue;
    throw new DataError(
      "format/unknown",
      `The file is ${what}, by its signature at byte ${found}. ${formatsRead}`,
      `byte ${found}`,
    );
  }
}

function isAt(bytes: Uint8Array, offset: number, signature: readonly number[]): boolean {
  return signature.every((byte, index) => bytes[offset + index] === byte);
}
