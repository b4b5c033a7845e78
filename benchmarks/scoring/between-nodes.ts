/** Error norms between the nodes, by the reconstruction that a submission declares. */

import { reconstructLines, type AxisReconstruction, type LineAxis } from "../interpolation/reconstruct-lines";
import { sumErrors, type GridValues } from "../norms/error-norms";
import type { ErrorSums } from "../norms/error-sums";
import type { ProblemDefinition } from "../problems/definition";
import { evaluateExact } from "../problems/exact-solution";
import { cellEdges } from "../quadrature/cell-widths";
import { gaussPanels, type QuadraturePoints } from "../quadrature/gauss-panels";
import type { Declaration, Reconstruction } from "./declaration";
import type { RunAxis } from "./read-run";

/** Points in each Gauss panel of a bounded axis. */
const panelPoints = 16;

/**
 * How many points per axis the norms between nodes are taken at: max(1024, 4 N) up to 16384 in 1-D, max(256, 2 N) up
 * to 2048 in 2-D, N being the finest run's.
 *
 * @example betweenPointCount(600, 1) // 2400
 * @see the page /scoring, "Between nodes"
 */
export function betweenPointCount(finest: number, dimension: number): number {
  const count =
    dimension === 1 ? Math.min(16384, Math.max(1024, 4 * finest)) : Math.min(2048, Math.max(256, 2 * finest));
  return panelPoints * Math.ceil(count / panelPoints);
}

/**
 * Nodes along each axis of the finest runs: the largest n of any run along that axis.
 *
 * @example finestNodes([{ n: [16, 32] }, { n: [32, 16] }]) // [32, 32]
 * @see the page /scoring, "Between nodes"
 */
export function finestNodes(runs: readonly { n: readonly number[] }[]): number[] {
  return (runs[0]?.n ?? []).map((_, axis) => Math.max(...runs.map((run) => run.n[axis])));
}

/**
 * The reconstruction along one axis. The two global ones complete each other on problems that are periodic along one
 * axis and bounded along the other.
 *
 * @example reconstructionAlong({ isPeriodic: true }, { kind: "polynomial" }).kind // "trigonometric"
 * @see Canuto et al. 2006, section 2.7 (Fourier in one direction, polynomials in the other)
 */
export function reconstructionAlong(
  axis: { isPeriodic: boolean },
  declared: Reconstruction,
): AxisReconstruction {
  if (declared.kind === "piecewise-polynomial") return declared;
  return { kind: axis.isPeriodic ? "trigonometric" : "polynomial" };
}

/** Points and weights along one axis: equispaced offsets (m + 1/2)/M where periodic, Gauss panels where bounded. */
function pointsAlong(axis: RunAxis, count: number): QuadraturePoints {
  const { a, b, isPeriodic } = axis;
  if (!isPeriodic) {
    const panels = count / panelPoints;
    const edges = Float64Array.from({ length: panels + 1 }, (_, p) => a + ((b - a) * p) / panels);
    return gaussPanels(edges, panelPoints);
  }
  const points = Float64Array.from({ length: count }, (_, m) => a + ((m + 0.5) * (b - a)) / count);
  return { points, weights: new Float64Array(count).fill((b - a) / count) };
}

function transpose(values: Float64Array, rows: number, columns: number): Float64Array {
  const out = new Float64Array(values.length);
  for (let i = 0; i < rows; i++)
    for (let j = 0; j < columns; j++) out[j * rows + i] = values[i * columns + j];
  return out;
}

/** A run's reconstruction: where it is evaluated, and how. Made once for a run. */
export interface BetweenGrid {
  points: QuadraturePoints[];
  reconstruct(values: Float64Array): Float64Array;
}

/**
 * Prepares the norms between nodes of one run.
 *
 * @param axes the run's axes
 * @param declaration with a reconstruction
 * @param finest nodes along each axis of the submission's finest run
 * @returns null where no reconstruction is declared
 * @example betweenGrid(run.axes, declaration, [256])?.reconstruct(u)
 * @see the page /scoring, "Between nodes"
 */
export function betweenGrid(
  axes: readonly RunAxis[],
  declaration: Declaration,
  finest: readonly number[],
): BetweenGrid | null {
  const declared = declaration.reconstruction;
  if (!declared) return null;
  const points = axes.map((axis, i) => pointsAlong(axis, betweenPointCount(finest[i], axes.length)));
  const lines = axes.map((axis): LineAxis => {
    const hasEdges = declaration.values === "cellAverage";
    return { ...axis, edges: hasEdges ? cellEdges(axis.nodes, axis.a, axis.b, axis.isPeriodic) : null };
  });
  const along = (values: Float64Array, i: number) =>
    reconstructLines(values, lines[i], reconstructionAlong(axes[i], declared), points[i].points);
  const reconstruct = (values: Float64Array) => {
    if (axes.length === 1) return along(values, 0);
    const rows = along(values, 1);
    const columns = along(transpose(rows, axes[0].n, points[1].points.length), 0);
    return transpose(columns, points[1].points.length, points[0].points.length);
  };
  return { points, reconstruct };
}

/**
 * Sums of the error of a reconstructed field against u*.
 *
 * @example normsOf([sumBetween(problem, "u", 1, u, grid)]).l2
 * @see LeVeque 2007, appendix A
 */
export function sumBetween(
  problem: ProblemDefinition,
  field: string,
  t: number | null,
  u: GridValues,
  grid: BetweenGrid,
): ErrorSums {
  const exact = evaluateExact(
    problem,
    field,
    t,
    grid.points.map(({ points }) => points),
  );
  const values = grid.reconstruct(u.values);
  const imaginary = u.imaginary && grid.reconstruct(u.imaginary);
  return sumErrors(
    { values, imaginary },
    exact,
    grid.points.map(({ weights }) => weights),
  );
}
