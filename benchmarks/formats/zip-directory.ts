/** The central directory of a zip archive, read whole and checked before any entry is opened. */

import { DataError } from "../scoring/data-error";

import { badZip } from "./bad-zip";
import { localDataStart } from "./zip-local-header";
import { readZip64End, readZip64Sizes, type DirectoryEnd } from "./zip64";

/**
 * One entry of the archive, as its central directory states it.
 *
 * @example readZipDirectory(bytes).map((entry) => entry.name) // ["x.npy", "u.npy"]
 */
export interface ZipEntry {
  name: string;
  method: "stored" | "deflated";
  crc: number;
  packedBytes: number;
  /** Size once unpacked, as declared. Nothing has been unpacked yet. */
  bytes: number;
  /** Byte offset of the packed data. */
  dataAt: number;
}

const endSignature = 0x06054b50;
const entrySignature = 0x02014b50;
const endBytes = 22;
const maxCommentBytes = 65535;
const maxEntries = 64;
const maxNameBytes = 255;
const all32 = 0xffffffff;

/**
 * Lists the entries of a zip archive by its central directory, with zip64 where NumPy writes it.
 *
 * Every entry's local header is read too and must agree. Refused are encrypted entries, methods but stored
 * and deflated, repeated names, data of entries that overlap, archives of several volumes, and more than 64
 * entries.
 *
 * @param bytes the whole archive
 * @returns entries in the order of the directory; sizes as declared
 * @throws DataError `format/truncated`, `format/bad-zip`, `format/encrypted`, `format/zip-method` or
 *   `format/duplicate-entry`, naming the entry and byte offset
 * @example const entries = readZipDirectory(bytes)
 * @see PKWARE APPNOTE.TXT 6.3.10, 4.3.12 (central directory) and 4.3.16 (end record)
 */
export function readZipDirectory(bytes: Uint8Array): ZipEntry[] {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const end = findEnd(view);
  if (end.entryCount > maxEntries) {
    throw badZip(`The archive claims ${end.entryCount} entries, at most ${maxEntries} are read`, end.endAt);
  }
  if (end.directoryAt + end.directoryBytes !== end.endAt) {
    throw badZip(
      `The central directory is said to lie at bytes ${end.directoryAt} to ` +
        `${end.directoryAt + end.directoryBytes}, but must end at byte ${end.endAt}`,
      end.endAt,
    );
  }
  const entries: ZipEntry[] = [];
  const names = new Set<string>();
  let at = end.directoryAt;
  for (let i = 0; i < end.entryCount; i++) {
    const { entry, next } = readEntry(bytes, view, at, end.endAt);
    if (names.has(entry.name)) {
      throw new DataError(
        "format/duplicate-entry",
        `The archive holds the entry "${entry.name}" twice, the second time at byte ${at}. Write each array once.`,
        `entry ${entry.name}, byte ${at}`,
      );
    }
    names.add(entry.name);
    entries.push(entry);
    at = next;
  }
  if (at !== end.endAt) throw badZip("The central directory holds more than the stated entries", at);
  refuseOverlaps(entries, end.directoryAt);
  return entries;
}

function findEnd(view: DataView): DirectoryEnd {
  const last = view.byteLength - endBytes;
  for (let at = last; at >= Math.max(0, last - maxCommentBytes); at--) {
    if (view.getUint32(at, true) !== endSignature) continue;
    if (at + endBytes + view.getUint16(at + 20, true) !== view.byteLength) continue;
    return readEnd(view, at);
  }
  throw new DataError(
    "format/truncated",
    `The archive has no end record: the file stops at byte ${view.byteLength} before its central directory is ` +
      "complete. Send the whole file.",
    `byte ${view.byteLength}`,
  );
}

function readEnd(view: DataView, at: number): DirectoryEnd {
  const zip64 = readZip64End(view, at);
  if (zip64 !== null) return zip64;
  const [disk, directoryDisk, entriesHere, entryCount] = [4, 6, 8, 10].map((k) =>
    view.getUint16(at + k, true),
  );
  if (disk !== 0 || directoryDisk !== 0 || entriesHere !== entryCount) {
    throw badZip("The archive consists of several volumes, expected was one", at + 4);
  }
  return {
    entryCount,
    directoryBytes: view.getUint32(at + 12, true),
    directoryAt: view.getUint32(at + 16, true),
    endAt: at,
  };
}

function readEntry(
  bytes: Uint8Array,
  view: DataView,
  at: number,
  endAt: number,
): { entry: ZipEntry; next: number } {
  if (at + 46 > endAt || view.getUint32(at, true) !== entrySignature) {
    throw badZip("An entry of the central directory does not begin with its signature", at);
  }
  const nameBytes = view.getUint16(at + 28, true);
  const extraBytes = view.getUint16(at + 30, true);
  const next = at + 46 + nameBytes + extraBytes + view.getUint16(at + 32, true);
  if (next > endAt) throw badZip("An entry of the central directory runs beyond the directory's end", at);
  if (nameBytes > maxNameBytes)
    throw badZip(
      `The name of an entry is ${nameBytes} bytes long, at most ${maxNameBytes} are read`,
      at + 28,
    );
  const name = new TextDecoder().decode(bytes.subarray(at + 46, at + 46 + nameBytes));
  const flags = view.getUint16(at + 8, true);
  if (flags & 0x2041) {
    throw new DataError(
      "format/encrypted",
      `The entry "${name}" is encrypted (byte ${at + 8}). Write the archive without a password.`,
      `entry ${name}, byte ${at + 8}`,
    );
  }
  const methodCode = view.getUint16(at + 10, true);
  if (methodCode !== 0 && methodCode !== 8) {
    throw new DataError(
      "format/zip-method",
      `The entry "${name}" is packed with method ${methodCode} (byte ${at + 10}). Stored (0) and deflated (8) ` +
        "are read, as numpy.savez and numpy.savez_compressed write them.",
      `entry ${name}, byte ${at + 10}`,
    );
  }
  const sizes = {
    bytes: view.getUint32(at + 24, true),
    packedBytes: view.getUint32(at + 20, true),
    headerAt: view.getUint32(at + 42, true),
  };
  if (sizes.bytes === all32 || sizes.packedBytes === all32 || sizes.headerAt === all32) {
    readZip64Sizes(view, at + 46 + nameBytes, extraBytes, sizes);
  }
  const dataAt = localDataStart(bytes, view, { at, nameBytes, methodCode, headerAt: sizes.headerAt, name });
  const method = methodCode === 0 ? "stored" : "deflated";
  if (method === "stored" && sizes.bytes !== sizes.packedBytes) {
    throw badZip(`The stored entry "${name}" has two different sizes`, at + 20, name);
  }
  const crc = view.getUint32(at + 16, true);
  return { entry: { name, method, crc, dataAt, bytes: sizes.bytes, packedBytes: sizes.packedBytes }, next };
}

function refuseOverlaps(entries: readonly ZipEntry[], directoryAt: number): void {
  let free = 0;
  for (const entry of [...entries].sort((a, b) => a.dataAt - b.dataAt)) {
    if (entry.dataAt < free) {
      throw badZip(`The entry "${entry.name}" overlaps the one before it`, entry.dataAt, entry.name);
    }
    free = entry.dataAt + entry.packedBytes;
    if (free > directoryAt) {
      throw badZip(
        `The entry "${entry.name}" claims ${entry.packedBytes} bytes from byte ${entry.dataAt} on, which runs ` +
          `into the central directory at byte ${directoryAt}`,
        entry.dataAt,
        entry.name,
      );
    }
  }
}
