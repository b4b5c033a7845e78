/** The exact solution on a run's grid: at its nodes, or averaged over its cells. */

import type { GridValues } from "../norms/error-norms";
import type { ProblemDefinition } from "../problems/definition";
import { evaluateExact } from "../problems/exact-solution";
import { cellEdges } from "../quadrature/cell-widths";
import { gaussPanels } from "../quadrature/gauss-panels";

/** One axis of the grid that u* is wanted on. */
export interface EvaluationAxis {
  nodes: Float64Array;
  a: number;
  b: number;
  isPeriodic: boolean;
}

/** Gauss points in each cell along each axis. */
const pointsPerCell = 8;
/** Evaluations at a time, so that averages over a large grid need little memory. */
const blockSize = 2 ** 20;

/** Gauss points of every cell, points across the seam of a periodic axis brought back into [a, b]. */
function cellPoints(axis: EvaluationAxis): { points: Float64Array; shares: Float64Array } {
  const { nodes, a, b, isPeriodic } = axis;
  const edges = cellEdges(nodes, a, b, isPeriodic);
  const { points, weights } = gaussPanels(edges, pointsPerCell);
  const length = b - a;
  for (let i = 0; i < points.length; i++) {
    const cell = Math.floor(i / pointsPerCell);
    weights[i] /= edges[cell + 1] - edges[cell];
    if (isPeriodic && points[i] < a) points[i] += length;
    if (isPeriodic && points[i] >= b) points[i] -= length;
  }
  return { points, shares: weights };
}

/** Averages rows of point values over cells of the last axis, adding `share` times them to the cells' row. */
function addAverages(
  from: Float64Array,
  start: number,
  shares: Float64Array,
  share: number,
  to: Float64Array,
  row: number,
): void {
  const cells = shares.length / pointsPerCell;
  for (let j = 0; j < cells; j++) {
    let sum = 0;
    for (let k = j * pointsPerCell; k < (j + 1) * pointsPerCell; k++) sum += shares[k] * from[start + k];
    to[row + j] += share * sum;
  }
}

function averageOverCells(
  problem: ProblemDefinition,
  field: string,
  t: number | null,
  axes: readonly EvaluationAxis[],
): GridValues {
  const inner = cellPoints(axes[axes.length - 1]);
  const outer = axes.length === 2 ? cellPoints(axes[0]) : null;
  const cells = axes.reduce((product, axis) => product * axis.nodes.length, 1);
  const values = new Float64Array(cells);
  let imaginary: Float64Array | null = null;
  if (!outer) {
    const step = blockSize - (blockSize % pointsPerCell);
    for (let from = 0; from < inner.points.length; from += step) {
      const points = inner.points.subarray(from, from + step);
      const shares = inner.shares.subarray(from, from + step);
      const block = evaluateExact(problem, field, t, [points]);
      addAverages(block.values, 0, shares, 1, values, from / pointsPerCell);
      if (!block.imaginary) continue;
      imaginary ??= new Float64Array(cells);
      addAverages(block.imaginary, 0, shares, 1, imaginary, from / pointsPerCell);
    }
    return { values, imaginary };
  }
  const columns = axes[1].nodes.length;
  const step = Math.max(1, Math.floor(blockSize / inner.points.length));
  for (let from = 0; from < outer.points.length; from += step) {
    const rows = outer.points.subarray(from, from + step);
    const block = evaluateExact(problem, field, t, [rows, inner.points]);
    if (block.imaginary) imaginary ??= new Float64Array(cells);
    for (let i = 0; i < rows.length; i++) {
      const row = Math.floor((from + i) / pointsPerCell) * columns;
      const start = i * inner.points.length;
      addAverages(block.values, start, inner.shares, outer.shares[from + i], values, row);
      if (block.imaginary && imaginary) {
        addAverages(block.imaginary, start, inner.shares, outer.shares[from + i], imaginary, row);
      }
    }
  }
  return { values, imaginary };
}

/**
 * The exact solution as a run's values should be: at the nodes, or averaged over the cells by 8-point Gauss per axis.
 *
 * @param problem the test problem
 * @param field name of the field
 * @param t time, null for a steady problem
 * @param axes nodes and interval of each axis
 * @param kind what the submission's values are
 * @returns row-major values, one for each node
 * @example exactOnGrid(problem, "u", 1, [{ nodes, a: 0, b: 1, isPeriodic: true }], "cellAverage").values
 * @see LeVeque 2002, section 4.1 (cell averages)
 */
export function exactOnGrid(
  problem: ProblemDefinition,
  field: string,
  t: number | null,
  axes: readonly EvaluationAxis[],
  kind: "point" | "cellAverage",
): GridValues {
  if (kind === "cellAverage") return averageOverCells(problem, field, t, axes);
  return evaluateExact(
    problem,
    field,
    t,
    axes.map((axis) => axis.nodes),
  );
}
