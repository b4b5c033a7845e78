/** Runs Python with NumPy for the tests: files and figures that do not come from our own code. */

import { spawnSync } from "node:child_process";

/** Debian's Python first: its NumPy is the package python3-numpy that the tests ask for. */
const candidates = ["/usr/bin/python3", "python3"];
let found: string | null = null;

/** Path of a Python that can import NumPy. Throws where there is none: such tests are never skipped. */
export function findPython(): string {
  found ??= candidates.find(canImportNumpy) ?? null;
  if (found === null) {
    throw new Error(
      `NumPy is missing: none of ${candidates.join(", ")} can import it. Install it with: apt-get install python3-numpy`,
    );
  }
  return found;
}

/** Runs a script and returns what it prints. One thread, and no BLAS settings of the surroundings. */
export function runPython(script: string, args: string[] = []): string {
  const result = spawnSync(findPython(), [script, ...args], {
    encoding: "utf8",
    env: pythonEnvironment(),
    maxBuffer: 64 * 2 ** 20,
  });
  if (result.error) throw result.error;
  if (result.status !== 0) throw new Error(`${script} ended with ${result.status}: ${result.stderr}`);
  return result.stdout;
}

function canImportNumpy(python: string): boolean {
  return (
    spawnSync(python, ["-c", "import numpy"], { stdio: "ignore", env: pythonEnvironment() }).status === 0
  );
}

function pythonEnvironment(): NodeJS.ProcessEnv {
  const env: NodeJS.ProcessEnv = { ...process.env, OMP_NUM_THREADS: "1", OPENBLAS_NUM_THREADS: "1" };
  delete env.OPENBLAS_CORETYPE;
  return env;
}
