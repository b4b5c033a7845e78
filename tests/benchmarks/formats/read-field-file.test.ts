import { describe, expect, test } from "vitest";

import { readFieldFile } from "@/benchmarks/formats/read-field-file";
import { writeNpy } from "@/benchmarks/formats/write-npy";
import { writeNpz } from "@/benchmarks/formats/write-npz";
import { refusalOf } from "@/tests/support/refusals";

const npy = writeNpy({ shape: [2], values: Float64Array.of(1, 2) });
const hdf5 = [0x89, 0x48, 0x44, 0x46, 0x0d, 0x0a, 0x1a, 0x0a];
const behindUserBlock = [...new Uint8Array(512), ...hdf5];

describe("the format of a file", () => {
  test.each([
    ["u.npy", npy, "npy"],
    ["u.csv", npy, "npy"],
    ["u.npz", npy, "npy"],
    ["u", writeNpz({ u: { shape: [2], values: Float64Array.of(1, 2) } }), "npz"],
    ["RUN.CSV", new TextEncoder().encode("x,u\n0,1\n1,2\n"), "csv"],
    ["run.tsv", new TextEncoder().encode("x\tu\n0\t1\n1\t2\n"), "csv"],
  ])("of %s follows from its content, then from its name", (name, bytes, format) => {
    const file = readFieldFile(name, bytes);
    expect(file.format).toBe(format);
    expect(file.arrays.get("u")?.values).toEqual(Float64Array.of(1, 2));
  });

  test.each([
    ["run.h5", hdf5, "an HDF5 file", "byte 0"],
    ["run.mat", behindUserBlock, "an HDF5 file", "byte 512"],
    ["run.csv", hdf5, "an HDF5 file", "byte 0"],
    ["run.mat", [...new TextEncoder().encode("MATLAB 5.0 MAT-file, ")], "a MATLAB file", "byte 0"],
    ["run.nc", [0x43, 0x44, 0x46, 1], "a NetCDF file", "byte 0"],
    ["run.csv.gz", [0x1f, 0x8b, 8], "a gzip file", "byte 0"],
    ["run.vtk", [1, 2, 3], "run.vtk", "byte 0"],
    ["run", [1, 2, 3], '"run"', "byte 0"],
    ["run.npz", [1, 2, 3], "not an NPZ file", "byte 0"],
  ])("of %s is none that is read, and the refusal says which are", (name, bytes, said, where) => {
    const refusal = refusalOf(() => readFieldFile(name, Uint8Array.from(bytes)));
    expect(refusal.message).toContain(said);
    expect(refusal.message).toContain("The formats that are read are NPY, NPZ, CSV and TSV");
    expect(refusal.where).toBe(where);
  });

  test("of a pickle is refused by that name", () => {
    expect(refusalOf(() => readFieldFile("u.npy", Uint8Array.of(0x80, 4, 0x95)))).toMatchObject({
      code: "format/pickle",
      where: "byte 0",
    });
  });

  test("of an empty file, or of other bytes under .npy, is refused at byte 0", () => {
    expect(refusalOf(() => readFieldFile("u.npy", new Uint8Array(0)))).toMatchObject({
      code: "format/empty",
    });
    expect(refusalOf(() => readFieldFile("u.npy", Uint8Array.of(1, 2)))).toMatchObject({
      code: "format/bad-magic",
      where: "byte 0",
    });
  });
});

test("the arrays are no views of the file's bytes", () => {
  const bytes = writeNpz({ u: { shape: [2], values: Float64Array.of(1, 2) } });
  const values = readFieldFile("u.npz", bytes).arrays.get("u")?.values;
  bytes.fill(0);
  expect(values).toEqual(Float64Array.of(1, 2));
});
