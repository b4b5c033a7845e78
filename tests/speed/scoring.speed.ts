/**
 * CPU time of reading, evaluating and taking norms, as a ratio to plain broadcast NumPy on the same files.
 *
 * Run by `npm run speed`. One thread each; every case is passed several times and its median taken.
 */

import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

import { compileExpression, type CompiledExpression } from "@/benchmarks/expressions/compile-expression";
import { evaluateOnGrid } from "@/benchmarks/expressions/evaluate-on-grid";
import { readFieldFile } from "@/benchmarks/formats/read-field-file";
import type { ArrayToWrite } from "@/benchmarks/formats/write-npy";
import { writeNpz } from "@/benchmarks/formats/write-npz";
import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import { normsOf, sumErrors } from "@/benchmarks/norms/error-norms";
import { weightsOf } from "@/benchmarks/quadrature/quadrature-weights";
import { runPython } from "@/tests/support/numpy";

interface Case {
  label: string;
  /** Name of the same function in scoring_numpy.py. */
  exact: string;
  expression: string;
  axes: string[];
  /** Nodes along every axis, one entry a file. */
  nodes: number[];
  passes: number;
}

const front = "tanh((x + y - 0.8)/0.2) + exp(-((x - 0.3)^2 + (y - 0.6)^2)/0.02)";
const large2d = { axes: ["x", "y"], nodes: [2048], passes: 7 };
const cases: Case[] = [
  {
    label: "1-D, 2^20 nodes, sin",
    exact: "wave",
    expression: "sin(x - 0.3)",
    axes: ["x"],
    nodes: [2 ** 20],
    passes: 9,
  },
  { label: "2-D, 2048 x 2048, tanh and Gaussian", exact: "front", expression: front, ...large2d },
  { label: "2-D, 2048 x 2048, sin times cos", exact: "product", expression: "sin(x)*cos(y)", ...large2d },
  {
    label: "500 runs of 32 to 256 nodes, sin",
    exact: "wave",
    expression: "sin(x - 0.3)",
    axes: ["x"],
    nodes: Array.from({ length: 500 }, (_, i) => 32 + Math.round((224 * i) / 499)),
    passes: 9,
  },
];

function compile({ expression, axes }: Case): CompiledExpression {
  return compileExpression(expression, { axes, scalars: [] });
}

/** The exact values with an error of 1e-6 that changes from node to node. */
function writeRun(path: string, compiled: CompiledExpression, n: number): void {
  const axis = nodesOf("uniform", n, 0, 1);
  const { values } = evaluateOnGrid(compiled, { coordinates: compiled.axes.map(() => axis) });
  for (let i = 0; i < values.length; i++) values[i] += 1e-6 * Math.sin(i);
  const arrays: Record<string, ArrayToWrite> = { u: { shape: compiled.axes.map(() => n), values } };
  for (const name of compiled.axes) arrays[name] = { shape: [n], values: axis };
  writeFileSync(path, writeNpz(arrays));
}

function scoreFile(path: string, compiled: CompiledExpression): number[] {
  const { arrays } = readFieldFile(path, readFileSync(path));
  const u = arrays.get("u");
  const coordinates = compiled.axes.map((name) => arrays.get(name)?.values ?? new Float64Array(0));
  if (u === undefined) throw new Error(`${path} holds no u`);
  const weights = coordinates.map((axis) => weightsOf("uniform", axis, axis[0], axis[axis.length - 1]));
  const { l1, l2, max, relL1, relL2, relMax } = normsOf([
    sumErrors(u, evaluateOnGrid(compiled, { coordinates }), weights),
  ]);
  return [l1, l2, max, relL1 ?? NaN, relL2 ?? NaN, relMax ?? NaN];
}

interface Timing {
  seconds: number[];
  norms: number[];
}

function timeOurs(speedCase: Case, files: string[]): Timing {
  const seconds: number[] = [];
  let norms: number[] = [];
  for (let pass = 0; pass < speedCase.passes; pass++) {
    const start = process.cpuUsage();
    const compiled = compile(speedCase);
    for (const file of files) norms = scoreFile(file, compiled);
    const { user, system } = process.cpuUsage(start);
    seconds.push((user + system) / 1e6);
  }
  return { seconds, norms };
}

function timeNumpy({ exact, passes }: Case, files: string[], folder: string): Timing {
  const path = join(folder, "case.json");
  writeFileSync(path, JSON.stringify({ exact, passes, files }));
  return JSON.parse(runPython("tests/speed/scoring_numpy.py", [path])) as Timing;
}

function median(values: number[]): number {
  return [...values].sort((a, b) => a - b)[values.length >> 1];
}

/** Rounding of values near 1 moves a norm of 1e-6 by about 1e-10 of itself. */
function checkAgreement(label: string, ours: number[], numpy: number[]): void {
  ours.forEach((value, i) => {
    if (Math.abs(value - numpy[i]) <= 1e-9 * numpy[i]) return;
    throw new Error(`${label}: norm ${i} is ${value}, NumPy has ${numpy[i]}`);
  });
}

/** Both on the same files, one right after the other; returns the ratio of the medians. */
function runCase(speedCase: Case): number {
  const folder = mkdtempSync(join(tmpdir(), "scoring-speed-"));
  try {
    const compiled = compile(speedCase);
    const files = speedCase.nodes.map((n, k) => {
      const path = join(folder, `run${k}.npz`);
      writeRun(path, compiled, n);
      return path;
    });
    const numpy = timeNumpy(speedCase, files, folder);
    const ours = timeOurs(speedCase, files);
    checkAgreement(speedCase.label, ours.norms, numpy.norms);
    const [a, b] = [median(ours.seconds), median(numpy.seconds)];
    const times = [a, ours.seconds[0], b].map(ms).join("");
    console.log(`${speedCase.label.padEnd(38)}${times}${(a / b).toFixed(2).padStart(8)}`);
    return a / b;
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function main(): void {
  console.log("CPU time of read + evaluate + norms, one thread, median of the passes");
  console.log(
    `${"".padEnd(38)}${["ours", "first pass", "NumPy"].map((t) => t.padStart(13)).join("")}   ratio`,
  );
  const ratios = cases.map(runCase);
  const mean = Math.exp(ratios.reduce((sum, ratio) => sum + Math.log(ratio), 0) / ratios.length);
  console.log(`${"geometric mean of the ratios".padEnd(77)}${mean.toFixed(2).padStart(8)}`);
}

function ms(seconds: number): string {
  return `${(1000 * seconds).toFixed(1).padStart(10)} ms`;
}

main();
