/** The header that stands before each entry's data in a zip archive. */

import { badZip } from "./bad-zip";

const localSignature = 0x04034b50;

/**
 * What the central directory says about an entry, to be compared with its local header.
 *
 * @example const stated: StatedEntry = { at: 200, nameBytes: 5, methodCode: 0, headerAt: 0, name: "u.npy" }
 */
export interface StatedEntry {
  /** Byte offset of the entry in the central directory. */
  at: number;
  nameBytes: number;
  methodCode: number;
  headerAt: number;
  name: string;
}

/**
 * Finds where an entry's data begin, and holds its local header against the central directory.
 *
 * @param bytes the whole archive
 * @param view the same bytes
 * @param stated the entry as the central directory states it
 * @returns byte offset of the packed data
 * @throws DataError `format/bad-zip` where the header is missing or contradicts the directory
 * @example localDataStart(bytes, view, { at: 200, nameBytes: 5, methodCode: 0, headerAt: 0, name: "u.npy" }) // 35
 * @see PKWARE APPNOTE.TXT 6.3.10, 4.3.7
 */
export function localDataStart(bytes: Uint8Array, view: DataView, stated: StatedEntry): number {
  const { headerAt, name } = stated;
  if (headerAt + 30 > stated.at || view.getUint32(headerAt, true) !== localSignature) {
    throw badZip(`The entry "${name}" has no header at byte ${headerAt}`, stated.at + 42, name);
  }
  if (view.getUint16(headerAt + 8, true) !== stated.methodCode) {
    throw badZip(`The entry "${name}" names two packing methods`, headerAt + 8, name);
  }
  const nameBytes = view.getUint16(headerAt + 26, true);
  const isSameName =
    nameBytes === stated.nameBytes &&
    headerAt + 30 + nameBytes <= stated.at &&
    isEqual(bytes, headerAt + 30, stated.at + 46, nameBytes);
  if (!isSameName) throw badZip(`The entry "${name}" has two different names`, headerAt + 26, name);
  return headerAt + 30 + nameBytes + view.getUint16(headerAt + 28, true);
}

function isEqual(bytes: Uint8Array, a: number, b: number, length: number): boolean {
  for (let i = 0; i < length; i++) if (bytes[a + i] !== bytes[b + i]) return false;
  return true;
}
