/** The checksum that zip archives carry for every entry. */

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
  let sum = 0xffffffff;
  let i = 0;
  for (; i + 8 <= bytes.length; i += 8) {
    sum ^= bytes[i] | (bytes[i + 1] << 8) | (bytes[i + 2] << 16) | (bytes[i + 3] << 24);
    sum =
      t7[sum & 255] ^
      t6[(sum >>> 8) & 255] ^
      t5[(sum >>> 16) & 255] ^
      t4[sum >>> 24] ^
      t3[bytes[i + 4]] ^
      t2[bytes[i + 5]] ^
      t1[bytes[i + 6]] ^
      t0[bytes[i + 7]];
  }
  for (; i < bytes.length; i++) sum = t0[(sum ^ bytes[i]) & 255] ^ (sum >>> 8);
  return ~sum >>> 0;
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
