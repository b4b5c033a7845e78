/** The checksum that zip archives carry for every entry. */

import { isHostLittleEndian } from "./host-byte-order";

const tableCount = 8;
const tables = makeTables();

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
  const [t0, t1, t2, t3, t4, t5, t6, t7] = tables;
  // Whole words are read where words may begin; the bytes before and after go one by one.
  const from = Math.min(bytes.length, -bytes.byteOffset & 3);
  const wordCount = isHostLittleEndian ? 2 * ((bytes.length - from) >> 3) : 0;
  const words =
    wordCount > 0 ? new Int32Array(bytes.buffer, bytes.byteOffset + from, wordCount) : new Int32Array(0);
  let sum = sumBytes(-1, bytes, 0, from);
  for (let k = 0; k < wordCount; k += 2) {
    const low = words[k] ^ sum;
    const high = words[k + 1];
    sum =
      t7[low & 255] ^
      t6[(low >>> 8) & 255] ^
      t5[(low >>> 16) & 255] ^
      t4[low >>> 24] ^
      t3[high & 255] ^
      t2[(high >>> 8) & 255] ^
      t1[(high >>> 16) & 255] ^
      t0[high >>> 24];
  }
  return ~sumBytes(sum, bytes, from + 4 * wordCount, bytes.length) >>> 0;
}

function sumBytes(start: number, bytes: Uint8Array, from: number, to: number): number {
  const [table] = tables;
  let sum = start;
  for (let i = from; i < to; i++) sum = table[(sum ^ bytes[i]) & 255] ^ (sum >>> 8);
  return sum;
}

function makeTables(): Int32Array[] {
  const first = Int32Array.from({ length: 256 }, (_, byte) => {
    let sum = byte;
    for (let bit = 0; bit < 8; bit++) sum = sum & 1 ? (sum >>> 1) ^ 0xedb88320 : sum >>> 1;
    return sum;
  });
  const all = [first];
  for (let k = 1; k < tableCount; k++) {
    all.push(all[k - 1].map((sum) => first[sum & 255] ^ (sum >>> 8)));
  }
  return all;
}
