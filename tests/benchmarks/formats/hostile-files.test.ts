import { afterAll, beforeAll, describe, expect, test } from "vitest";

import { defaultLimits } from "@/benchmarks/formats/field-file";
import { readFieldFile } from "@/benchmarks/formats/read-field-file";
import { writeNpy } from "@/benchmarks/formats/write-npy";
import { writeNpz } from "@/benchmarks/formats/write-npz";
import { DataError } from "@/benchmarks/scoring/data-error";
import { writeNumpyFiles, type NumpyFiles } from "@/tests/support/numpy-files";
import { refusalOf } from "@/tests/support/refusals";

import { makeRandom } from "./make-random";

let numpy: NumpyFiles;
beforeAll(() => {
  numpy = writeNumpyFiles();
});
afterAll(() => numpy.remove());

const whole = [
  "v1-little-f8-C2.npy",
  "v2-big-c16-F4.npy",
  "v3-little-i8-F3.npy",
  "stored.npz",
  "deflated.npz",
];

/** An NPY file of version 1.0 with any header text. */
function npyWith(header: string, dataBytes = 32, version = 1): Uint8Array {
  const text = new TextEncoder().encode(header);
  const lengthBytes = version === 1 ? 2 : 4;
  const bytes = new Uint8Array(8 + lengthBytes + text.length + dataBytes);
  bytes.set([0x93, 0x4e, 0x55, 0x4d, 0x50, 0x59, version, 0]);
  new DataView(bytes.buffer).setUint16(8, text.length, true);
  bytes.set(text, 8 + lengthBytes);
  return bytes;
}

const goodHeader = "{'descr': '<f8', 'fortran_order': False, 'shape': (4,), }";

describe("a truncated file", () => {
  test.each(whole)("%s, cut at every 16th byte, is refused with the byte where it ends or breaks", (file) => {
    const bytes = numpy.read(file);
    for (let length = 0; length < bytes.length; length += 16) {
      const refusal = refusalOf(() => readFieldFile(file, bytes.subarray(0, length)));
      expect(refusal.where, `cut at ${length}`).toMatch(/byte \d+/);
    }
  });

  test("is refused with the byte at which it ends and the byte at which it should end", () => {
    const bytes = writeNpy({ shape: [4], values: new Float64Array(4) });
    const refusal = refusalOf(() => readFieldFile("u.npy", bytes.subarray(0, 151)));
    expect(refusal).toMatchObject({ code: "format/truncated", where: "byte 151" });
    expect(refusal.message).toContain("ends at byte 160");
  });

  test("is not the only wrong length: bytes behind the values are refused too", () => {
    const bytes = writeNpy({ shape: [4], values: new Float64Array(4) });
    const twice = Uint8Array.of(...bytes, ...bytes);
    const refusal = refusalOf(() => readFieldFile("u.npy", twice));
    expect(refusal).toMatchObject({ code: "format/trailing-bytes", where: "byte 160" });
  });
});

describe("a lying header", () => {
  test.each([
    ["(1000000000000,)", "format/too-many-values"],
    ["(1000000, 1000000)", "format/too-many-values"],
    ["(4294967296, 4294967296, 4294967296)", "format/too-many-values"],
    ["(9007199254740993,)", "format/bad-header"],
    ["(99999999999999999999999,)", "format/bad-header"],
    ["(-4,)", "format/bad-header"],
    ["(4)", "format/bad-header"],
    ["[4]", "format/bad-header"],
    ["(True,)", "format/bad-header"],
    ["(1,1,1,1,1,1,1,1,4)", "format/bad-header"],
    ["(5,)", "format/truncated"],
    ["(3,)", "format/trailing-bytes"],
    ["(2, 3)", "format/truncated"],
  ])("with the shape %s is refused before anything of its size is allocated", (shape, code) => {
    const refusal = refusalOf(() => readFieldFile("u.npy", npyWith(goodHeader.replace("(4,)", shape))));
    expect(refusal.code).toBe(code);
    expect(refusal.where).toMatch(/^byte \d+$/);
  });

  test.each([
    ["", 10],
    ["{", 11],
    ["{}", 10],
    ["__import__('os').system('true')", 10],
    ["{'descr': '<f8', 'fortran_order': False, 'shape': (4,), 'more': 1}", 74],
    ["{'descr': '<f8', 'fortran_order': False}", 10],
    ["{'descr': '<f8', 'descr': '<f8'}", 27],
    ["{'descr': '<f8', 'fortran_order': 0, 'shape': (4,)}", 44],
    ["{'descr': '<f8', 'fortran_order': False, 'shape': (2+2,)}", 62],
    [`${goodHeader} 1`, 68],
    ["{'descr': " + "(".repeat(60000), 36],
    ["{'descr': '\\x3cf8'}", 21],
  ])("that is not the dictionary NumPy writes is refused at the byte (case %#)", (header, byte) => {
    const refusal = refusalOf(() => readFieldFile("u.npy", npyWith(header)));
    expect(refusal).toMatchObject({ code: "format/bad-header", where: `byte ${byte}` });
  });

  test("as Python 2 wrote it, with long integers, reads", () => {
    const header = "{'descr': '<f8', 'fortran_order': False, 'shape': (4L,), }";
    expect(readFieldFile("u.npy", npyWith(header)).arrays.get("u")?.shape).toEqual([4]);
  });

  test("of 4 GiB or of an unknown version is refused", () => {
    const long = npyWith(goodHeader, 32, 2);
    new DataView(long.buffer).setUint32(8, 0xffffffff, true);
    expect(refusalOf(() => readFieldFile("u.npy", long))).toMatchObject({ where: "byte 8" });
    const later = npyWith(goodHeader);
    later[6] = 4;
    expect(refusalOf(() => readFieldFile("u.npy", later))).toMatchObject({
      code: "format/bad-version",
      where: "byte 6",
    });
  });
});

describe("the limits", () => {
  const bytes = writeNpz({ u: { shape: [64], values: new Float64Array(64) } });

  test.each([
    ["maxBytes", bytes.length, "format/too-large"],
    ["maxNodes", 64, "format/too-many-values"],
    // 128 bytes of header and 512 of values.
    ["maxUnpackedBytes", 640, "format/too-large"],
  ])("of %s admit a file at the limit and refuse it one below", (limit, value, code) => {
    expect(readFieldFile("u.npz", bytes, { ...defaultLimits, [limit]: value }).arrays.size).toBe(1);
    const refusal = refusalOf(() => readFieldFile("u.npz", bytes, { ...defaultLimits, [limit]: value - 1 }));
    expect(refusal.code).toBe(code);
    expect(refusal.where).not.toBeNull();
  });

  test("count all arrays of an archive together, in double precision", () => {
    const two = writeNpz({
      u: { shape: [64], values: new Float64Array(64) },
      v: { shape: [64], values: new Float64Array(64) },
    });
    const refusal = refusalOf(() =>
      readFieldFile("u.npz", two, { ...defaultLimits, maxUnpackedBytes: 1000 }),
    );
    expect(refusal).toMatchObject({ code: "format/too-large" });
    expect(refusal.where).toContain("entry v.npy");
  });
});

describe("a mutated file", () => {
  const seed = Number(process.env.MUTATION_SEED ?? 20260);
  const rounds = 1500;

  test.each(whole)(
    `%s (${rounds} mutations, MUTATION_SEED=${seed}) is read or refused with a place`,
    (file) => {
      const random = makeRandom(seed);
      const bytes = numpy.read(file);
      let refused = 0;
      for (let round = 0; round < rounds; round++) {
        const mutated = bytes.slice();
        const changes = 1 + Math.floor(4 * random());
        for (let k = 0; k < changes; k++) {
          mutated[Math.floor(random() * mutated.length)] = Math.floor(256 * random());
        }
        try {
          expect(readFieldFile(file, mutated).arrays.size).toBeGreaterThan(0);
        } catch (error) {
          if (!(error instanceof DataError))
            throw new Error(`round ${round} of seed ${seed}`, { cause: error });
          expect(error.where, `round ${round} of seed ${seed}: ${error.message}`).toMatch(/byte \d+/);
          refused++;
        }
      }
      console.info(`${file}: seed ${seed}, ${rounds} mutations, ${refused} refused`);
    },
  );
});
