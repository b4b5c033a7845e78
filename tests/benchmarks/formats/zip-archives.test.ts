import { crc32 as zlibCrc32 } from "node:zlib";

import { describe, expect, test } from "vitest";

import { crc32 } from "@/benchmarks/formats/crc-32";
import { defaultLimits } from "@/benchmarks/formats/field-file";
import { readFieldFile } from "@/benchmarks/formats/read-field-file";
import { writeNpy } from "@/benchmarks/formats/write-npy";
import { refusalOf } from "@/tests/support/refusals";

import { makeRandom } from "./make-random";
import { makeZip, type EntryToMake } from "./make-zip";

const content = writeNpy({ shape: [8], values: Float64Array.of(1, 2, 3, 4, 5, 6, 7, 8) });
const u: EntryToMake = { name: "u.npy", content };

function refusalOfZip(entries: EntryToMake[]) {
  return refusalOf(() => readFieldFile("run.npz", makeZip(entries)));
}

test("CRC-32 of the digits 1 to 9 is 0xCBF43926, the check value of ISO/IEC 13239 (from memory)", () => {
  expect(crc32(new TextEncoder().encode("123456789"))).toBe(0xcbf43926);
});

test("CRC-32 agrees with zlib at every length and alignment", () => {
  const random = makeRandom(7);
  const bytes = Uint8Array.from({ length: 64 }, () => 256 * random());
  for (let from = 0; from < 8; from++) {
    for (let to = from; to <= bytes.length; to++) {
      const part = bytes.subarray(from, to);
      expect(crc32(part)).toBe(zlibCrc32(part));
    }
  }
});

describe("an NPZ archive", () => {
  test.each([false, true])("reads where it is sound (deflated: %s)", (isDeflated) => {
    const file = readFieldFile("run.npz", makeZip([{ ...u, isDeflated }]));
    expect(file.arrays.get("u")?.values).toEqual(Float64Array.of(1, 2, 3, 4, 5, 6, 7, 8));
  });

  test.each([
    ["holds an entry twice", [u, u], "format/duplicate-entry"],
    ["is encrypted", [{ ...u, states: { flags: 1 } }], "format/encrypted"],
    ["is strongly encrypted", [{ ...u, states: { flags: 0x40 } }], "format/encrypted"],
    ["is packed with bzip2", [{ ...u, states: { method: 12 } }], "format/zip-method"],
    ["states another checksum", [{ ...u, states: { crc: 1 } }], "format/bad-checksum"],
    [
      "states another checksum, deflated",
      [{ ...u, isDeflated: true, states: { crc: 1 } }],
      "format/bad-checksum",
    ],
    ["has two names for an entry", [{ ...u, states: { localName: "v.npy" } }], "format/bad-zip"],
    ["has two sizes for a stored entry", [{ ...u, states: { bytes: 64 } }], "format/bad-zip"],
    ["states more data than there are", [{ ...u, states: { bytes: 9999, packed: 9999 } }], "format/bad-zip"],
    ["holds a folder", [{ name: "run/", content: new Uint8Array(0) }], "format/entry-name"],
    ["names a folder", [{ ...u, name: "run/u.npy" }], "format/entry-name"],
    ["climbs out of its folder", [{ ...u, name: "../u.npy" }], "format/entry-name"],
    ["starts at the root", [{ ...u, name: "/u.npy" }], "format/entry-name"],
    ["uses back slashes", [{ ...u, name: "..\\u.npy" }], "format/entry-name"],
    ["holds another kind of file", [u, { name: "notes.txt", content }], "format/entry-name"],
    ["has a nameless array", [{ ...u, name: ".npy" }], "format/entry-name"],
    ["has a name of 300 letters", [{ ...u, name: "u".repeat(300) }], "format/bad-zip"],
    ["holds no array", [], "format/no-arrays"],
    [
      "holds 65 entries",
      Array.from({ length: 65 }, (_, i) => ({ ...u, name: `u${i}.npy` })),
      "format/bad-zip",
    ],
    ["holds an NPY name on other bytes", [{ ...u, content: Uint8Array.of(1, 2, 3) }], "format/bad-magic"],
  ] as [string, EntryToMake[], string][])("that %s is refused with the place", (_, entries, code) => {
    const refusal = refusalOfZip(entries);
    expect(refusal.code).toBe(code);
    expect(refusal.where).toMatch(/byte \d+$/);
  });

  test("whose entries share their data is refused", () => {
    const bytes = makeZip([u, { ...u, name: "v.npy" }]);
    const view = new DataView(bytes.buffer);
    const end = bytes.length - 22;
    const second = view.getUint32(end + 16, true) + 46 + 5;
    // The second entry now points at the first one's header, under the first one's name.
    view.setUint32(second + 42, 0, true);
    bytes[second + 46] = "u".charCodeAt(0);
    expect(refusalOf(() => readFieldFile("run.npz", bytes)).code).toBe("format/duplicate-entry");
    bytes[second + 46] = "v".charCodeAt(0);
    expect(refusalOf(() => readFieldFile("run.npz", bytes)).code).toBe("format/bad-zip");
  });

  test("that stands behind other bytes is refused", () => {
    const zip = makeZip([u]);
    const shifted = Uint8Array.of(0x50, 0x4b, 3, 4, ...zip);
    expect(refusalOf(() => readFieldFile("run.npz", shifted)).code).toBe("format/bad-zip");
  });
});

describe("a zip bomb", () => {
  const zeros = new Uint8Array(300 * 2 ** 20);

  test("that declares its size is refused before anything is unpacked", () => {
    const bytes = makeZip([{ name: "u.npy", content: zeros, isDeflated: true }]);
    expect(bytes.length).toBeLessThan(2 ** 20);
    const before = process.memoryUsage().arrayBuffers;
    const refusal = refusalOf(() => readFieldFile("bomb.npz", bytes));
    expect(process.memoryUsage().arrayBuffers - before).toBeLessThan(2 ** 20);
    expect(refusal.code).toBe("format/too-large");
    expect(refusal.message).toContain(String(defaultLimits.maxUnpackedBytes));
    expect(refusal.where).toMatch(/^entry u\.npy, byte \d+$/);
  });

  test("that declares less than it holds is stopped at the declared size", () => {
    const bytes = makeZip([{ name: "u.npy", content: zeros, isDeflated: true, states: { bytes: 4096 } }]);
    const refusal = refusalOf(() => readFieldFile("bomb.npz", bytes));
    expect(refusal.code).toBe("format/bad-zip");
    expect(refusal.message).toContain("more than the 4096 bytes");
  });

  test("that declares more than it holds is refused", () => {
    const small = makeZip([{ ...u, isDeflated: true, states: { bytes: 4096 } }]);
    expect(refusalOf(() => readFieldFile("bomb.npz", small)).message).toContain("unpacks to 192 bytes");
    const impossible = makeZip([{ ...u, isDeflated: true, states: { bytes: 2 ** 27 } }]);
    expect(refusalOf(() => readFieldFile("bomb.npz", impossible)).message).toContain("can hold");
  });

  test("of many entries is refused by the sum of what they declare", () => {
    const part = zeros.subarray(0, 60 * 2 ** 20);
    const entries = Array.from({ length: 5 }, (_, i) => ({
      name: `u${i}.npy`,
      content: part,
      isDeflated: true,
    }));
    const refusal = refusalOfZip(entries);
    expect(refusal).toMatchObject({ code: "format/too-large" });
    expect(refusal.where).toContain("entry u4.npy");
  });
});
