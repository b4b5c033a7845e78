/** Zip64: sizes and offsets of 64 bits, which NumPy writes for large arrays. */

import { badZip } from "./bad-zip";

const locatorSignature = 0x07064b50;
const zip64EndSignature = 0x06064b50;
const all32 = 0xffffffff;
const zip64Tag = 1;

/**
 * Where a central directory lies and how many entries it has.
 *
 * @example const end: DirectoryEnd = { entryCount: 2, directoryBytes: 92, directoryAt: 1024, endAt: 1116 }
 */
export interface DirectoryEnd {
  entryCount: number;
  directoryBytes: number;
  directoryAt: number;
  /** Byte offset of the end record itself. */
  endAt: number;
}

/**
 * Sizes and place of an entry; 0xFFFFFFFF stands for a value kept in the zip64 field.
 *
 * @example const sizes: EntrySizes = { bytes: 0xffffffff, packedBytes: 512, headerAt: 0 }
 */
export interface EntrySizes {
  bytes: number;
  packedBytes: number;
  headerAt: number;
}

/**
 * Reads the zip64 end record, where a locator stands before the ordinary end record.
 *
 * @param view the whole archive
 * @param endAt byte offset of the ordinary end record
 * @returns the directory's place, or null where the archive has no zip64 end record
 * @throws DataError `format/bad-zip` where locator and record contradict each other
 * @example readZip64End(view, view.byteLength - 22) // null for small archives
 * @see PKWARE APPNOTE.TXT 6.3.10, 4.3.14 and 4.3.15
 */
export function readZip64End(view: DataView, endAt: number): DirectoryEnd | null {
  const locatorAt = endAt - 20;
  if (locatorAt < 0 || view.getUint32(locatorAt, true) !== locatorSignature) return null;
  const at = readUint64(view, locatorAt + 8);
  if (at + 56 > locatorAt || view.getUint32(at, true) !== zip64EndSignature) {
    throw badZip("The zip64 locator does not point at a zip64 end record", locatorAt + 8);
  }
  const entryCount = readUint64(view, at + 32);
  const isOneVolume = view.getUint32(at + 16, true) === 0 && view.getUint32(at + 20, true) === 0;
  if (!isOneVolume || readUint64(view, at + 24) !== entryCount) {
    throw badZip("The archive consists of several volumes, expected was one", at + 16);
  }
  return {
    entryCount,
    directoryBytes: readUint64(view, at + 40),
    directoryAt: readUint64(view, at + 48),
    endAt: at,
  };
}

/**
 * Replaces the sizes that stand as 0xFFFFFFFF by those of the entry's zip64 field.
 *
 * @param view the whole archive
 * @param extraAt byte offset of the entry's extra fields in the central directory
 * @param extraBytes their length
 * @param sizes the entry's sizes, changed in place
 * @throws DataError `format/bad-zip` where the field is missing or short
 * @example readZip64Sizes(view, 251, 28, sizes)
 * @see PKWARE APPNOTE.TXT 6.3.10, 4.5.3
 */
export function readZip64Sizes(view: DataView, extraAt: number, extraBytes: number, sizes: EntrySizes): void {
  const extraEnd = extraAt + extraBytes;
  for (let at = extraAt; at + 4 <= extraEnd;) {
    const fieldEnd = at + 4 + view.getUint16(at + 2, true);
    if (fieldEnd > extraEnd) break;
    if (view.getUint16(at, true) !== zip64Tag) {
      at = fieldEnd;
      continue;
    }
    let next = at + 4;
    for (const key of ["bytes", "packedBytes", "headerAt"] as const) {
      if (sizes[key] !== all32) continue;
      if (next + 8 > fieldEnd) throw badZip("The zip64 field of an entry is too short", at);
      sizes[key] = readUint64(view, next);
      next += 8;
    }
    return;
  }
  throw badZip("An entry refers to a zip64 field that is not there", extraAt);
}

/** Beyond 2^53 the nearest double: larger than any file, so that range checks refuse it. */
function readUint64(view: DataView, at: number): number {
  return view.getUint32(at + 4, true) * 2 ** 32 + view.getUint32(at, true);
}
