/** Unpacks one entry of a zip archive within its declared size, and verifies its checksum. */

import { Inflate, type FlateError } from "fflate";

import { DataError } from "../scoring/data-error";

import { crc32 } from "./crc-32";
import type { ZipEntry } from "./zip-directory";

// Deflate makes at most 1032 bytes of one: a piece of 64 KiB can grow to 66 MiB before the size is checked.
const pieceBytes = 65536;
const largestRatio = 1032;

/**
 * Returns the unpacked bytes of an entry whose declared size has been found acceptable.
 *
 * Unpacking stops as soon as more bytes come out than declared, so that a lying size costs neither memory nor
 * time.
 *
 * @param archive the whole archive
 * @param entry the entry from `readZipDirectory`
 * @returns exactly `entry.bytes` bytes; a view of the archive where the entry is stored
 * @throws DataError `format/bad-zip` or `format/bad-checksum`, naming entry and byte offset
 * @example unpackEntry(bytes, readZipDirectory(bytes)[0])
 * @see RFC 1951 (DEFLATE)
 */
export function unpackEntry(archive: Uint8Array, entry: ZipEntry): Uint8Array {
  const packed = archive.subarray(entry.dataAt, entry.dataAt + entry.packedBytes);
  const bytes = entry.method === "stored" ? packed : inflate(packed, entry);
  const sum = crc32(bytes);
  if (sum !== entry.crc) {
    throw new DataError(
      "format/bad-checksum",
      `The entry "${entry.name}" (from byte ${entry.dataAt} on) has the CRC-32 ${hex(sum)}, the archive states ` +
        `${hex(entry.crc)}: its bytes were changed after it was written. Send the file again, in binary mode.`,
      `entry ${entry.name}, byte ${entry.dataAt}`,
    );
  }
  return bytes;
}

function inflate(packed: Uint8Array, entry: ZipEntry): Uint8Array {
  if (entry.bytes > packed.length * largestRatio) {
    throw badEntry(entry, `declares ${entry.bytes} bytes, more than ${packed.length} packed bytes can hold`);
  }
  const out = new Uint8Array(entry.bytes);
  let filled = 0;
  const inflater = new Inflate((piece) => {
    if (filled + piece.length > out.length) {
      throw badEntry(entry, `unpacks to more than the ${entry.bytes} bytes that it declares`);
    }
    out.set(piece, filled);
    filled += piece.length;
  });
  for (let at = 0; at < packed.length; at += pieceBytes) {
    const isLast = at + pieceBytes >= packed.length;
    try {
      inflater.push(packed.subarray(at, at + pieceBytes), isLast);
    } catch (error) {
      if (!isFlateError(error)) throw error;
      const range = `${entry.dataAt + at} and ${entry.dataAt + Math.min(at + pieceBytes, packed.length)}`;
      throw badEntry(entry, `does not unpack (${error.message}) between bytes ${range}`);
    }
  }
  if (filled !== entry.bytes) throw badEntry(entry, `unpacks to ${filled} bytes and declares ${entry.bytes}`);
  return out;
}

function badEntry(entry: ZipEntry, found: string): DataError {
  return new DataError(
    "format/bad-zip",
    `The entry "${entry.name}" (from byte ${entry.dataAt} on) ${found}. Write the archive anew with numpy.savez.`,
    `entry ${entry.name}, byte ${entry.dataAt}`,
  );
}

function isFlateError(error: unknown): error is FlateError {
  return error instanceof Error && "code" in error && typeof error.code === "number";
}

function hex(sum: number): string {
  return `0x${sum.toString(16).padStart(8, "0")}`;
}
