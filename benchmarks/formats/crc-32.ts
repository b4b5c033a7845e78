/** The checksum that zip archives carry for every entry. */

import { isHostLittleEndian } from "./host-byte-order";

/** Eight tables of 256 in one array: entry 256 k + b is the sum of byte b followed by k zero bytes. */
const table = makeTable();

/**
 * CRC-32 of the bytes, with the reversed polynomial 0xEDB88320 of zip, eight bytes at a time.
 *
 * @param bytes what to sum
 * @returns the checksum, 0 to 2^32 - 1
 * @example crc32(new TextEncoder().encode("123456789")) // 0xcbf43926
 * @see ISO/IEC 13239:2002, 4.2.5.2; Kounavis and Berry (2008), "Novel table lookup-based algorithms for
 *   high-performance CRC generation" (slicing by eight)
 */
export function crc32(bytes: Uint8Array): number {
  // Whole words are read where words may begin; the bytes before and after go one by one.
  const from = Math.min(bytes.length, -bytes.byteOffset & 3);
  const wordCount = isHostLittleEndian ? 2 * ((bytes.length - from) >> 3) : 0;
  let sum = sumBytes(-1, bytes, 0, from);
  if (wordCount > 0) sum = sumWords(sum, new Int32Array(bytes.buffer, bytes.byteOffset + from, wordCount));
  return ~sumBytes(sum, bytes, from + 4 * wordCount, bytes.length) >>> 0;
}

function sumWords(start: number, words: Int32Array): number {
  let sum = start;
  for (let k = 0; k + 1 < words.length; k += 2) {
    const low = words[k] ^ sum;
    const high = words[k + 1];
    sum =
      table[1792 + (low & 255)] ^
      table[1536 + ((low >>> 8) & 255)] ^
      table[1280 + ((low >>> 16) & 255)] ^
      table[1024 + (low >>> 24)] ^
      table[768 + (high & 255)] ^
      table[512 + ((high >>> 8) & 255)] ^
      table[256 + ((high >>> 16) & 255)] ^
      table[high >>> 24];
  }
  return sum;
}

function sumBytes(start: number, bytes: Uint8Array, from: number, to: number): number {
  let sum = start;
  for (let i = from; i < to; i++) sum = table[(sum ^ bytes[i]) & 255] ^ (sum >>> 8);
  return sum;
}

function makeTable(): Int32Array {
  const all = new Int32Array(8 * 256);
  for (let byte = 0; byte < 256; byte++) {
    let sum = byte;
    for (let bit = 0; bit < 8; bit++) sum = sum & 1 ? (sum >>> 1) ^ 0xedb88320 : sum >>> 1;
    all[byte] = sum;
  }
  for (let i = 256; i < all.length; i++) all[i] = all[all[i - 256] & 255] ^ (all[i - 256] >>> 8);
  return all;
}
