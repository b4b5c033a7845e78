import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { runPython } from "./numpy";

export interface StudyFiles {
  pathOf(name: string): string;
  /** One for each n, in their order. */
  paths: string[];
  /** A table of N = 32 with a value that is not a number in row 7. */
  brokenPath: string;
  remove(): void;
}

/** A second-order study of the problem `advection-exp-sine`, computed and written by NumPy. */
export function writeStudyFiles(nodes: number[]): StudyFiles {
  const folder = mkdtempSync(join(tmpdir(), "study-"));
  runPython("tests/fixtures/numpy/write_study.py", [folder, ...nodes.map(String)]);
  const nameOf = (n: number) => `field-N${String(n).padStart(3, "0")}.npy`;
  return {
    pathOf: (name) => join(folder, name),
    paths: nodes.map((n) => join(folder, nameOf(n))),
    brokenPath: join(folder, "field-N032.csv"),
    remove: () => rmSync(folder, { recursive: true }),
  };
}
