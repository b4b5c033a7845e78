import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

import { expect, test } from "vitest";

import { readFieldFile } from "@/benchmarks/formats/read-field-file";
import { writeNpy, type ArrayToWrite } from "@/benchmarks/formats/write-npy";
import { writeNpz } from "@/benchmarks/formats/write-npz";
import { runPython } from "@/tests/support/numpy";

const arrays: Record<string, ArrayToWrite> = {
  none: { shape: [], values: Float64Array.of(1.5) },
  one: { shape: [3], values: Float64Array.of(0.1, -0, 5e-324) },
  two: { shape: [2, 3], values: Float64Array.of(1, 2, 3, 4, 5, 6) },
  complex: { shape: [2], values: Float64Array.of(1, 2), imaginary: Float64Array.of(-1, -2) },
};

test("NumPy reads what the writers write, and numpy.save writes the same bytes", () => {
  const folder = mkdtempSync(join(tmpdir(), "written-files-"));
  try {
    for (const [name, array] of Object.entries(arrays)) {
      writeFileSync(join(folder, `${name}.npy`), writeNpy(array));
    }
    writeFileSync(join(folder, "run.npz"), writeNpz({ x: arrays.one, u: arrays.two }));
    expect(JSON.parse(runPython("tests/fixtures/numpy/check_written_files.py", [folder]))).toEqual({
      "none.npy": { shape: [], dtype: "<f8", same: true },
      "one.npy": { shape: [3], dtype: "<f8", same: true },
      "two.npy": { shape: [2, 3], dtype: "<f8", same: true },
      "complex.npy": { shape: [2], dtype: "<c16", same: true },
      "run.npz": {
        x: [0.1, -0, 5e-324],
        u: [
          [1, 2, 3],
          [4, 5, 6],
        ],
      },
    });
  } finally {
    rmSync(folder, { recursive: true });
  }
});

test("the reader gives back what the writers were given", () => {
  for (const [name, { shape, values, imaginary = null }] of Object.entries(arrays)) {
    const read = readFieldFile(`${name}.npy`, writeNpy({ shape, values, imaginary })).arrays.get("u");
    expect(read).toMatchObject({ shape, values, imaginary });
  }
  expect([...readFieldFile("run.npz", writeNpz(arrays)).arrays.keys()]).toEqual(Object.keys(arrays));
});

test("the same arrays give the same bytes, and so the same checksum", () => {
  expect(writeNpz(arrays)).toEqual(writeNpz(arrays));
});

test("a shape that the values do not fill is refused", () => {
  expect(() => writeNpy({ shape: [2, 2], values: new Float64Array(3) })).toThrow(RangeError);
});
