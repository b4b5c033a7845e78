/** What can be refused before any file is opened. */

import { gridKinds } from "../grids/grid-kind";
import type { Axis, ProblemDefinition } from "../problems/definition";
import type { Refusal } from "./data-error";
import type { Declaration, GridDeclaration, RunDeclaration } from "./declaration";

/**
 * Limits of a submission.
 *
 * @example submissionLimits.runs // 24
 * @see the page /scoring, "Bad data"
 */
export const submissionLimits = {
  runs: 24,
  leastNodes: 4,
  /** Nodes of a 1-D run. */
  mostNodes: 2 ** 22,
  /** Nodes along each axis of a 2-D run. */
  mostNodesPerAxis: 2048,
  /** Nodes along an axis of a Legendre grid, whose weights cost the square of it. */
  mostLegendreNodes: 8192,
  /** Nodes along an axis of a global polynomial reconstruction. */
  mostPolynomialNodes: 4096,
} as const;

const refusal = (
  code: string,
  message: string,
  file: string | null = null,
  where: string | null = null,
): Refusal => ({ code, message, file, where });

const isPeriodic = (axis: Axis) => axis.kind === "periodic";

/** Kinds on which finite volumes are defined: cells that reach from midpoint to midpoint. */
const averageKinds = ["uniform-periodic", "cell-centred", "uniform", "listed"];

function checkAxes(problem: ProblemDefinition, declaration: Declaration): Refusal[] {
  const refusals: Refusal[] = [];
  const names: string[] = problem.axes.map((axis) => axis.name);
  for (const name of Object.keys(declaration.grid)) {
    if (names.includes(name)) continue;
    const message = `The grid names an axis ${name}; ${problem.slug} has ${names.join(" and ")}. Leave it out.`;
    refusals.push(refusal("grid/unknown-axis", message, null, name));
  }
  problem.axes.forEach((axis, index) => {
    const grid = declaration.grid[axis.name];
    if (!grid) {
      const message = `No grid is declared for the axis ${axis.name}. Give its kind, one of ${problem.grids.kinds[index].join(", ")}.`;
      refusals.push(refusal("grid/missing-axis", message, null, axis.name));
      return;
    }
    refusals.push(...checkKind(problem, declaration, axis, grid, index));
  });
  return refusals;
}

function checkKind(
  problem: ProblemDefinition,
  declaration: Declaration,
  axis: Axis,
  grid: GridDeclaration,
  index: number,
): Refusal[] {
  const allowed = problem.grids.kinds[index];
  if (!gridKinds.includes(grid.kind) || !allowed.includes(grid.kind)) {
    const message =
      `The grid along ${axis.name} is declared as ${grid.kind}; ${problem.slug} allows ${allowed.join(", ")} ` +
      "along this axis.";
    return [refusal("grid/kind-not-allowed", message, null, axis.name)];
  }
  if (declaration.values === "cellAverage" && !averageKinds.includes(grid.kind)) {
    const message =
      `Cell averages are declared on a ${grid.kind} grid along ${axis.name}; they need one of ` +
      `${averageKinds.join(", ")}.`;
    return [refusal("grid/averages-need-cells", message, null, axis.name)];
  }
  return [];
}

function checkReconstruction(problem: ProblemDefinition, declaration: Declaration): Refusal[] {
  const { reconstruction } = declaration;
  if (!reconstruction) return [];
  const { kind } = reconstruction;
  if (kind === "piecewise-polynomial") {
    const { degree } = reconstruction;
    if (Number.isInteger(degree) && degree >= 1 && degree <= 7) return [];
    const message = `A piecewise polynomial of degree ${degree} is declared; degrees are whole numbers from 1 to 7.`;
    return [refusal("reconstruction/degree", message)];
  }
  const isTrigonometric = kind === "trigonometric";
  if (!problem.axes.some((axis) => isPeriodic(axis) === isTrigonometric)) {
    const message = isTrigonometric
      ? `A trigonometric reconstruction needs a periodic axis, and ${problem.slug} has none. Declare another.`
      : `A global polynomial needs a bounded axis, and ${problem.slug} has none. Declare trigonometric or piecewise-polynomial.`;
    return [refusal("reconstruction/not-on-this-axis", message)];
  }
  const listed = problem.axes.find(
    (axis) => isPeriodic(axis) && declaration.grid[axis.name]?.kind === "listed",
  );
  if (listed) {
    const message = `A trigonometric reconstruction needs equally spaced nodes, and the grid along ${listed.name} is listed.`;
    return [refusal("reconstruction/needs-equal-spacing", message, null, listed.name)];
  }
  if (declaration.values === "cellAverage" && problem.axes.some((axis) => !isPeriodic(axis))) {
    const message =
      "Cell averages on a bounded axis are reconstructed piecewise; declare piecewise-polynomial.";
    return [refusal("reconstruction/averages", message)];
  }
  return [];
}

function checkNodes(problem: ProblemDefinition, declaration: Declaration, run: RunDeclaration): Refusal[] {
  const { n, file } = run;
  const axes = problem.axes;
  const spoken = `n = [${n.join(", ")}]`;
  if (n.length !== axes.length) {
    const message = `The run declares ${spoken}; ${problem.slug} has ${axes.length === 1 ? "one axis" : "two axes"} (${axes.map((axis) => axis.name).join(", ")}), so n needs ${axes.length} number${axes.length === 1 ? "" : "s"}.`;
    return [refusal("run/wrong-n", message, file, "n")];
  }
  const tooFew = n.findIndex((count) => !Number.isInteger(count) || count < submissionLimits.leastNodes);
  if (tooFew >= 0) {
    const message = `The run declares ${spoken}; at least ${submissionLimits.leastNodes} nodes are needed along ${axes[tooFew].name}.`;
    return [refusal("run/too-few-nodes", message, file, axes[tooFew].name)];
  }
  for (const [i, axis] of axes.entries()) {
    const kind = declaration.grid[axis.name]?.kind ?? "listed";
    const limits = [axes.length === 1 ? submissionLimits.mostNodes : submissionLimits.mostNodesPerAxis];
    if (kind.startsWith("legendre")) limits.push(submissionLimits.mostLegendreNodes);
    const isGlobal =
      declaration.reconstruction?.kind === "polynomial" ||
      declaration.reconstruction?.kind === "trigonometric";
    if (isGlobal && !isPeriodic(axis)) limits.push(submissionLimits.mostPolynomialNodes);
    const limit = Math.min(...limits);
    if (n[i] <= limit) continue;
    const why = kind.startsWith("legendre") ? ` of a ${kind} grid` : "";
    const message = `The run declares ${spoken}; at most ${limit} nodes${why} are scored along ${axis.name} with what is declared.`;
    return [refusal("run/too-many-nodes", message, file, axis.name)];
  }
  return [];
}

function checkRunList(runs: readonly RunDeclaration[]): Refusal[] {
  if (runs.length === 0)
    return [refusal("run/none", "The submission has no runs; hand in at least one file.")];
  if (runs.length > submissionLimits.runs) {
    const message = `The submission has ${runs.length} runs; at most ${submissionLimits.runs} are scored.`;
    return [refusal("run/too-many", message)];
  }
  const refusals: Refusal[] = [];
  const study = new Map<string, string>();
  for (const run of runs) {
    const key = run.n.join(" x ");
    if (run.role !== "study") continue;
    const first = study.get(key);
    study.set(key, first ?? run.file);
    if (first === undefined) continue;
    const message =
      `${first} and ${run.file} both have n = ${key} and the role study. Give one of them the role timeStep or ` +
      "iteration, or leave it out.";
    refusals.push(refusal("run/same-n", message, run.file, "n"));
  }
  if (study.size === 0) {
    refusals.push(
      refusal("run/no-study", "No run has the role study; a ladder needs the run that it refines."),
    );
  }
  return refusals;
}

/**
 * Checks a declaration against its problem, before any file is opened.
 *
 * @param problem the test problem
 * @param declaration grid, values, reconstruction, precision and claim
 * @param runs n and role of each run
 * @returns everything that is wrong with it; empty where it can be scored
 * @example checkDeclaration(problem, declaration, runs).length // 0
 * @see the page /scoring, "Grids", "Between nodes" and "Bad data"
 */
export function checkDeclaration(
  problem: ProblemDefinition,
  declaration: Declaration,
  runs: readonly RunDeclaration[],
): Refusal[] {
  return [
    ...checkAxes(problem, declaration),
    ...checkReconstruction(problem, declaration),
    ...checkRunList(runs),
    ...runs.flatMap((run) => checkNodes(problem, declaration, run)),
  ];
}
