/** The score of one run: norms of its error and what else is measured of it. */

import type { FieldFile } from "../formats/field-file";
import { normsOf, sumErrors, type GridValues } from "../norms/error-norms";
import type { ErrorSums } from "../norms/error-sums";
import { takacsSplit } from "../norms/takacs-split";
import type { ProblemDefinition } from "../problems/definition";
import { weightsOf } from "../quadrature/quadrature-weights";
import { betweenGrid, sumBetween } from "./between-nodes";
import { boundaryDefects } from "./boundary-defect";
import { axisIntervals, geometricMean } from "./declared-grid";
import type { Declaration, RunDeclaration } from "./declaration";
import { exactOnGrid } from "./exact-on-grid";
import { functionalOf } from "./functional";
import { readRun, type RunFields } from "./read-run";
import { readFacts } from "./run-reading";
import type { RunScore, TimeScore } from "./result";

/** One field at one output time, beside u* on the same grid. */
interface Level {
  field: string;
  u: GridValues;
  exact: GridValues;
  sums: ErrorSums;
}

/** The largest error in the outer tenth of the domain (a twentieth of L at each end of a bounded axis) and elsewhere. */
function splitMaximum(run: RunFields, levels: readonly Level[]): { nearEnds: number; inside: number } | null {
  if (run.axes.every((axis) => axis.isPeriodic)) return null;
  const isOuter = run.axes.map((axis) => {
    const margin = (axis.b - axis.a) / 20;
    return Array.from(axis.nodes, (x) => !axis.isPeriodic && (x < axis.a + margin || x > axis.b - margin));
  });
  const columns = run.axes.length === 2 ? run.axes[1].n : 1;
  let nearEnds = 0;
  let inside = 0;
  for (const { u, exact } of levels) {
    for (let i = 0; i < u.values.length; i++) {
      const real = u.values[i] - exact.values[i];
      const imaginary = u.imaginary ? u.imaginary[i] - (exact.imaginary?.[i] ?? 0) : 0;
      const error = imaginary === 0 ? Math.abs(real) : Math.hypot(real, imaginary);
      const row = Math.floor(i / columns);
      const outer = isOuter[0][row] || (isOuter.length === 2 && isOuter[1][i % columns]);
      if (outer) nearEnds = Math.max(nearEnds, error);
      else inside = Math.max(inside, error);
    }
  }
  return { nearEnds, inside };
}

/** Takacs' split, where it is defined: one real field on equally spaced nodes of one periodic axis. */
function splitOf(run: RunFields, levels: readonly Level[]): RunScore["takacs"] {
  const [axis] = run.axes;
  const isEquallySpaced = axis.kind === "uniform-periodic" || axis.kind === "cell-centred";
  if (run.axes.length > 1 || !axis.isPeriodic || !isEquallySpaced) return null;
  const [{ u, exact }] = levels;
  if (levels.length > 1 || u.imaginary || exact.imaginary) return null;
  return takacsSplit(u.values, exact.values);
}

function massDefect(sums: ErrorSums, isComplex: boolean): { absolute: number; relative: number | null } {
  const absolute = isComplex ? Math.hypot(sums.defect, sums.imaginaryDefect) : sums.defect;
  return { absolute, relative: sums.exactL1 < 1e-300 ? null : absolute / sums.exactL1 };
}

function functionalOfLevels(
  problem: ProblemDefinition,
  run: RunFields,
  weights: Float64Array[],
  levels: readonly Level[],
): number | null {
  if (levels.some(({ u }) => u.imaginary)) return null;
  const coordinates = run.axes.map((axis) => axis.nodes);
  const fields = Object.fromEntries(levels.map(({ field, u }) => [field, u.values]));
  return functionalOf(problem, fields, coordinates, weights, run.times[run.times.length - 1]);
}

/**
 * Scores one run.
 *
 * u* is evaluated at the declared kind's exact nodes; the file's coordinates decide only on `listed` grids. Pure: the
 * same arguments give the same score on a server and in a browser.
 *
 * @param problem the test problem
 * @param declaration grid, values, reconstruction, precision and claim; checked by `checkDeclaration` before
 * @param run n, role and declared cost of this run
 * @param file its arrays, from `readFieldFile`
 * @param finest nodes along each axis of the submission's finest run, which sets how many points the norms between
 *   nodes are taken at; this run's own where it is not known
 * @returns norms at each output time, mass and boundary defect, Takacs' split, and facts that findings rest on
 * @throws DataError where the file cannot be scored: missing arrays, wrong shapes, values that are not finite,
 *   coordinates off the declared grid
 * @example scoreRun(problem, declaration, run, readFieldFile("n32.npz", bytes)).times[0].nodes.relL2
 * @see LeVeque 2007, appendix A (norms); Takacs 1985; the page /scoring
 */
export function scoreRun(
  problem: ProblemDefinition,
  declaration: Declaration,
  run: RunDeclaration,
  file: FieldFile,
  finest: readonly number[] = run.n,
): RunScore {
  const fields = readRun(problem, declaration, run, file);
  const { axes } = fields;
  const weights = axes.map((axis) => weightsOf(axis.kind, axis.nodes, axis.a, axis.b, axis.isPeriodic));
  const between = betweenGrid(axes, declaration, finest);
  const times: TimeScore[] = [];
  let levels: Level[] = [];
  fields.times.forEach((t, k) => {
    levels = fields.fields.map((field) => {
      const u = field.times[k];
      const exact = exactOnGrid(problem, field.name, t, axes, declaration.values);
      return { field: field.name, u, exact, sums: sumErrors(u, exact, weights) };
    });
    const betweenSums = between && levels.map(({ field, u }) => sumBetween(problem, field, t, u, between));
    times.push({
      t,
      nodes: normsOf(levels.map(({ sums }) => sums)),
      between: betweenSums && normsOf(betweenSums),
      components:
        levels.length < 2
          ? null
          : levels.map(({ field, sums }, i) => ({
              field,
              nodes: normsOf([sums]),
              between: betweenSums && normsOf([betweenSums[i]]),
            })),
    });
  });
  const [first] = levels;
  const nodes = run.n.reduce((product, count) => product * count, 1);
  const intervals = axisIntervals(axes);
  const defect = massDefect(first.sums, first.u.imaginary !== null);
  const exactMax = Math.max(...levels.map(({ sums }) => sums.exactMax));
  const split = splitMaximum(fields, levels);
  const norms = times[times.length - 1].nodes;
  const facts = { intervals, exact: first.exact, norms, exactMax, values: declaration.values };
  return {
    n: [...run.n],
    nodes,
    unknowns: run.unknowns ?? nodes,
    intervals: geometricMean(intervals),
    axisIntervals: intervals,
    times,
    massDefect: defect.absolute,
    relMassDefect: defect.relative,
    boundary: boundaryDefects(problem, fields, declaration),
    takacs: splitOf(fields, levels),
    exactMax,
    maxNearEnds: split?.nearEnds ?? null,
    maxInside: split?.inside ?? null,
    functional: functionalOfLevels(problem, fields, weights, levels),
    reading: readFacts(problem, fields, file, facts),
  };
}
