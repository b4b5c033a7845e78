/** The refusal of an archive that contradicts the zip format. */

import { DataError } from "../scoring/data-error";

/**
 * A refusal of an archive that contradicts the zip format.
 *
 * @param found what was found, without a full stop
 * @param byte byte offset in the archive
 * @param entry the entry's name where one is to blame
 * @returns the error to throw, code `format/bad-zip`
 * @example throw badZip("The archive consists of several volumes", 4)
 */
export function badZip(found: string, byte: number, entry: string | null = null): DataError {
  return new DataError(
    "format/bad-zip",
    `${found} (byte ${byte}). Write the archive anew with numpy.savez, and send it in binary mode.`,
    entry === null ? `byte ${byte}` : `entry ${entry}, byte ${byte}`,
  );
}
