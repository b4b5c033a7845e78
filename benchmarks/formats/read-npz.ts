/** Reads NPZ files, the zip archives of numpy.savez and numpy.savez_compressed. */

import { DataError } from "../scoring/data-error";

import { defaultLimits, type FieldArray, type ReadLimits } from "./field-file";
import { readNpy } from "./read-npy";
import { unpackEntry } from "./unpack-entry";
import { readZipDirectory, type ZipEntry } from "./zip-directory";

/**
 * Reads the arrays of an NPZ file by name.
 *
 * The declared sizes of all entries are checked against `maxUnpackedBytes` before the first one is unpacked,
 * unpacking stops at the declared size, and each entry's CRC-32 is verified.
 *
 * @param bytes the whole file
 * @param limits what may be allocated
 * @returns arrays by entry name without `.npy`, in the order of the archive
 * @throws DataError the codes of `readZipDirectory`, `unpackEntry` and `readNpy`, also `format/entry-name`,
 *   `format/too-large` and `format/no-arrays`, naming the entry and byte offset
 * @example readNpz(await readFile("n64.npz")).get("u")
 * @see https://numpy.org/doc/stable/reference/generated/numpy.savez.html
 */
export function readNpz(bytes: Uint8Array, limits: ReadLimits = defaultLimits): Map<string, FieldArray> {
  const entries = readZipDirectory(bytes);
  if (entries.length === 0) {
    throw new DataError(
      "format/no-arrays",
      "The archive is empty. Write u (and x) with numpy.savez.",
      "byte 0",
    );
  }
  const names = entries.map(arrayName);
  checkDeclaredSizes(entries, limits);
  const arrays = new Map<string, FieldArray>();
  let left = limits.maxUnpackedBytes;
  entries.forEach((entry, index) => {
    const array = readEntry(bytes, entry, { ...limits, maxUnpackedBytes: left });
    left -= array.values.byteLength + (array.imaginary?.byteLength ?? 0);
    arrays.set(names[index], array);
  });
  return arrays;
}

function arrayName(entry: ZipEntry): string {
  const where = `entry ${printable(entry.name)}, byte ${entry.dataAt}`;
  if (!entry.name.endsWith(".npy")) {
    throw new DataError(
      "format/entry-name",
      `The archive holds "${printable(entry.name)}", which is not an NPY file. An NPZ file holds u.npy and, where ` +
        "wanted, x.npy, y.npy and t.npy: write it with numpy.savez.",
      where,
    );
  }
  const name = entry.name.slice(0, -".npy".length);
  if (!/^[\p{L}_][\p{L}\p{N}_]{0,63}$/u.test(name)) {
    throw new DataError(
      "format/entry-name",
      `The entry "${printable(entry.name)}" is not named like an array: expected were a letter, then letters, ` +
        "digits and underscores, without folders. Write the file with numpy.savez(file, x=x, u=u).",
      where,
    );
  }
  return name;
}

/** At most 64 characters, control characters replaced, so that a hostile name cannot spoil a message. */
function printable(name: string): string {
  return name.slice(0, 64).replace(/[\p{C}"]/gu, "?");
}

function checkDeclaredSizes(entries: readonly ZipEntry[], limits: ReadLimits): void {
  let total = 0;
  for (const entry of entries) {
    total += entry.bytes;
    if (total <= limits.maxUnpackedBytes) continue;
    throw new DataError(
      "format/too-large",
      `The archive declares ${total} bytes unpacked up to the entry "${entry.name}". At most ` +
        `${limits.maxUnpackedBytes} bytes are unpacked from one file.`,
      `entry ${entry.name}, byte ${entry.dataAt}`,
    );
  }
}

function readEntry(bytes: Uint8Array, entry: ZipEntry, limits: ReadLimits): FieldArray {
  const unpacked = unpackEntry(bytes, entry);
  try {
    return readNpy(unpacked, limits);
  } catch (error) {
    if (!(error instanceof DataError)) throw error;
    throw new DataError(
      error.code,
      `Entry "${entry.name}": ${error.message}`,
      `entry ${entry.name}, ${error.where ?? "byte 0"}`,
    );
  }
}
