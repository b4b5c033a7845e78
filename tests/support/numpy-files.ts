/** Files that NumPy's own writers made for this run of the tests, with what they hold. */

import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

import { runPython } from "./numpy";

export interface NumpyArray {
  file: string;
  name: string;
  shape: number[];
  values: number[];
  imaginary: number[] | null;
  numberType: string;
  isFortranOrder: boolean;
}

export interface NumpyFiles {
  arrays: NumpyArray[];
  read(file: string): Uint8Array;
  remove(): void;
}

/** Runs tests/fixtures/numpy/write_field_files.py in a folder of its own. */
export function writeNumpyFiles(): NumpyFiles {
  const folder = mkdtempSync(join(tmpdir(), "numpy-files-"));
  runPython("tests/fixtures/numpy/write_field_files.py", [folder]);
  return {
    arrays: JSON.parse(readFileSync(join(folder, "manifest.json"), "utf8")) as NumpyArray[],
    read: (file) => new Uint8Array(readFileSync(join(folder, file))),
    remove: () => rmSync(folder, { recursive: true }),
  };
}
