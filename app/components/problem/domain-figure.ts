import { evaluateExact } from "@/benchmarks/problems/exact-solution";
import type { BoundaryCondition, ProblemDefinition } from "@/benchmarks/problems/definition";
import { contourPaths, type ContourPaths } from "./contour-paths";

export type EdgeKind = BoundaryCondition["kind"] | "periodic" | "none";

/** What the drawing of a domain shows; worked out by the loader. */
export interface DomainFigure {
  dimension: 1 | 2;
  /** Left and right, and in 2-D bottom and top. */
  edges: { left: EdgeKind; right: EdgeKind; bottom: EdgeKind | null; top: EdgeKind | null };
  /** Paths in a frame of 1000 by 1000; the first time is left out for a steady problem. */
  first: string | null;
  last: string | null;
  contours: ContourPaths | null;
  /** Height over width of a 2-D domain. */
  aspect: number;
  field: string;
  isModulus: boolean;
  firstTime: number;
  lastTime: number | null;
}

const samples = 241;
const lattice = 61;

/** Samples the exact solution at its first and last time. */
export function domainFigure(problem: ProblemDefinition): DomainFigure {
  const field = problem.fields.find((one) => one.isScored) ?? problem.fields[0];
  const lastTime = problem.classification.isSteady ? null : Math.max(...problem.outputTimes);
  const { axes } = problem;
  const common = {
    edges: {
      left: edgeOf(problem, "x", "a"),
      right: edgeOf(problem, "x", "b"),
      bottom: axes.length > 1 ? edgeOf(problem, "y", "a") : null,
      top: axes.length > 1 ? edgeOf(problem, "y", "b") : null,
    },
    aspect: axes.length > 1 ? (axes[1].b - axes[1].a) / (axes[0].b - axes[0].a) : 1,
    field: field.name,
    isModulus: field.values === "complex",
    firstTime: problem.initialTime,
    lastTime,
  };
  if (axes.length > 1) {
    const values = sample(problem, field.name, lastTime, lattice);
    return { ...common, dimension: 2, first: null, last: null, contours: contourPaths(values, lattice) };
  }
  const last = sample(problem, field.name, lastTime, samples);
  const first = lastTime === null ? null : sample(problem, field.name, problem.initialTime, samples);
  const finite = [...last, ...(first ?? [])].filter(Number.isFinite);
  const range = { low: Math.min(0, ...finite), high: Math.max(...finite, Math.min(...finite) + 1e-9) };
  return {
    ...common,
    dimension: 1,
    first: first ? pathOf(first, range) : null,
    last: pathOf(last, range),
    contours: null,
  };
}

function edgeOf(problem: ProblemDefinition, axis: "x" | "y", end: "a" | "b"): EdgeKind {
  if (problem.axes.find((one) => one.name === axis)?.kind === "periodic") return "periodic";
  return problem.boundaryConditions.find((one) => one.axis === axis && one.end === end)?.kind ?? "none";
}

function sample(problem: ProblemDefinition, field: string, t: number | null, count: number): Float64Array {
  const coordinates = problem.axes.map(({ a, b }) =>
    Float64Array.from({ length: count }, (_, k) => a + ((b - a) * k) / (count - 1)),
  );
  const { values, imaginary } = evaluateExact(problem, field, t, coordinates);
  return imaginary ? values.map((value, k) => Math.hypot(value, imaginary[k])) : values;
}

function pathOf(values: Float64Array, { low, high }: { low: number; high: number }): string {
  let path = "";
  let isPenDown = false;
  values.forEach((value, k) => {
    if (!Number.isFinite(value)) return (isPenDown = false);
    const x = Math.round((1000 * k) / (values.length - 1));
    const y = Math.round(1000 - (940 * (value - low)) / (high - low));
    path += `${isPenDown ? "L" : "M"}${x} ${y}`;
    return (isPenDown = true);
  });
  return path;
}
