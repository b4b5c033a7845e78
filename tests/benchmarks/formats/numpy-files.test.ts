import { afterAll, beforeAll, describe, expect, test } from "vitest";

import { readFieldFile } from "@/benchmarks/formats/read-field-file";
import { writeNumpyFiles, type NumpyFiles } from "@/tests/support/numpy-files";
import { refusalOf } from "@/tests/support/refusals";

let numpy: NumpyFiles;
beforeAll(() => {
  numpy = writeNumpyFiles();
});
afterAll(() => numpy.remove());

function expectAsWritten(selected: (file: string) => boolean, count: number): void {
  const arrays = numpy.arrays.filter(({ file }) => selected(file));
  expect(arrays).toHaveLength(count);
  for (const written of arrays) {
    const read = readFieldFile(written.file, numpy.read(written.file)).arrays.get(written.name);
    expect(read, written.file).toEqual({
      shape: written.shape,
      values: Float64Array.from(written.values),
      imaginary: written.imaginary && Float64Array.from(written.imaginary),
      numberType: written.numberType,
      isFortranOrder: written.isFortranOrder,
    });
  }
}

describe("a file written by NumPy", () => {
  // Six number types, C and Fortran order in one to four dimensions.
  for (const version of ["1.0", "2.0", "3.0"]) {
    for (const order of ["little", "big"]) {
      test(`of header version ${version}, ${order}-endian, reads as it was written, bit for bit`, () => {
        expectAsWritten((file) => file.startsWith(`v${version[0]}-${order}-`), 30);
      });
    }
  }

  test.each(["stored", "deflated", "zip64"])("as an NPZ archive, %s, reads as it was written", (kind) => {
    expectAsWritten((file) => file === `${kind}.npz`, 3);
  });

  test("with no values, or with a single number, keeps its shape", () => {
    expectAsWritten((file) => file === "empty.npy" || file === "number.npy", 2);
  });

  test("with NaN and infinities reads as it is: the scorer refuses those", () => {
    const values = readFieldFile("nan.npy", numpy.read("nan.npy")).arrays.get("u")?.values;
    expect(values).toEqual(Float64Array.of(NaN, Infinity, -Infinity, 1));
  });

  test("with a whole number beyond 2^53 is refused with its index and byte offset", () => {
    const above = refusalOf(() => readFieldFile("beyond.npy", numpy.read("beyond.npy")));
    expect(above).toMatchObject({ code: "values/not-exact", where: "index 1, byte 136" });
    expect(above.message).toContain("9007199254740993");
    const below = refusalOf(() => readFieldFile("beyond.npy", numpy.read("beyond-below.npy")));
    expect(below).toMatchObject({ code: "values/not-exact", where: "index 2, byte 144" });
  });

  test.each([
    ["object", "format/pickle", "object array"],
    ["string", "format/number-type", "strings"],
    ["bytes", "format/number-type", "strings of bytes"],
    ["structured", "format/number-type", "structured array"],
    ["boolean", "format/number-type", "boolean values"],
    ["half", "format/number-type", "float16 values"],
    ["longdouble", "format/number-type", "float"],
    ["unsigned", "format/number-type", "uint32 values"],
    ["date", "format/number-type", "dates"],
  ])("of the number type %s is refused by that name and its byte offset", (kind, code, name) => {
    const refusal = refusalOf(() => readFieldFile("u.npy", numpy.read(`refused-${kind}.npy`)));
    expect(refusal.code).toBe(code);
    expect(refusal.message).toContain(name);
    expect(refusal.message).toContain('u.astype("float64")');
    expect(refusal.where).toMatch(/^byte \d+$/);
  });

  test("with a pickle inside an archive is refused with the entry's name", () => {
    const refusal = refusalOf(() => readFieldFile("u.npz", numpy.read("refused-object.npz")));
    expect(refusal.code).toBe("format/pickle");
    expect(refusal.where).toMatch(/^entry u\.npy, byte \d+$/);
  });
});
