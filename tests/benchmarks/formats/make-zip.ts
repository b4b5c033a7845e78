/** A zip archive written entry by entry, so that a test can have it lie. */

import { deflateRawSync, crc32 as zlibCrc32 } from "node:zlib";

export interface EntryToMake {
  name: string;
  content: Uint8Array;
  isDeflated?: boolean;
  /** Overrides of what the archive states. */
  states?: {
    bytes?: number;
    crc?: number;
    method?: number;
    flags?: number;
    localName?: string;
    packed?: number;
  };
}

/** Local headers, data, central directory, end record: APPNOTE.TXT 6.3.10, 4.3.6. */
export function makeZip(entries: EntryToMake[]): Uint8Array {
  const parts: Buffer[] = [];
  const directory: Buffer[] = [];
  let at = 0;
  for (const { name, content, isDeflated = false, states = {} } of entries) {
    const packed = isDeflated ? deflateRawSync(content) : Buffer.from(content);
    const fields = Buffer.alloc(26);
    fields.writeUInt16LE(20, 0);
    fields.writeUInt16LE(states.flags ?? 0, 2);
    fields.writeUInt16LE(states.method ?? (isDeflated ? 8 : 0), 4);
    fields.writeUInt32LE(states.crc ?? zlibCrc32(content), 10);
    fields.writeUInt32LE(states.packed ?? packed.length, 14);
    fields.writeUInt32LE(states.bytes ?? content.length, 18);
    const localName = Buffer.from(states.localName ?? name);
    const local = Buffer.concat([Buffer.from("PK\x03\x04"), fields, localName]);
    local.writeUInt16LE(localName.length, 26);
    parts.push(local, packed);

    const entry = Buffer.concat([
      Buffer.from("PK\x01\x02\x14\x00"),
      fields,
      Buffer.alloc(14),
      Buffer.from(name),
    ]);
    entry.writeUInt16LE(Buffer.byteLength(name), 28);
    entry.writeUInt32LE(at, 42);
    directory.push(entry);
    at += local.length + packed.length;
  }
  const listing = Buffer.concat(directory);
  const end = Buffer.alloc(22);
  end.write("PK\x05\x06", "latin1");
  end.writeUInt16LE(entries.length, 8);
  end.writeUInt16LE(entries.length, 10);
  end.writeUInt32LE(listing.length, 12);
  end.writeUInt32LE(at, 16);
  return new Uint8Array(Buffer.concat([...parts, listing, end]));
}
