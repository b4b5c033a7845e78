/** The grid that a submission declares for one run, axis by axis. */

import { intervalsOf } from "../grids/grid-nodes";
import type { DeclaredAxis } from "../grids/match-coordinates";
import type { ProblemDefinition } from "../problems/definition";
import type { Declaration } from "./declaration";

/**
 * The declared axes of a run of n nodes, in the order of the problem's axes.
 *
 * @throws RangeError where an axis has no declared grid or n has the wrong length: `checkDeclaration` refuses both
 * @example declaredAxes(problem, declaration, [32])[0].kind // "uniform-periodic"
 * @see the page /scoring, "Grids"
 */
export function declaredAxes(
  problem: ProblemDefinition,
  declaration: Declaration,
  n: readonly number[],
): DeclaredAxis[] {
  if (n.length !== problem.axes.length) {
    throw new RangeError(`A run of ${problem.slug} has ${problem.axes.length} axes, not ${n.length}`);
  }
  return problem.axes.map((axis, index) => {
    const grid = declaration.grid[axis.name];
    if (!grid) throw new RangeError(`No grid is declared for the axis ${axis.name}`);
    const { name, a, b } = axis;
    return { name, kind: grid.kind, n: n[index], a, b, isPeriodic: axis.kind === "periodic" };
  });
}

/**
 * Intervals that refinement divides along each axis.
 *
 * @example axisIntervals([{ name: "x", kind: "uniform", n: 33, a: 0, b: 1, isPeriodic: false }]) // [32]
 * @see LeVeque 2007, section 2.4
 */
export function axisIntervals(axes: readonly DeclaredAxis[]): number[] {
  return axes.map((axis) => intervalsOf(axis.kind, axis.n, axis.isPeriodic));
}

/**
 * Geometric mean of positive numbers: how a 2-D grid is told as one number of intervals.
 *
 * @example geometricMean([4, 9]) // 6
 * @see Roache 1998, chapter 5 (grids of several dimensions)
 */
export function geometricMean(values: readonly number[]): number {
  if (values.length === 1) return values[0];
  if (values.every((value) => value === values[0])) return values[0];
  return values.reduce((product, value) => product * value, 1) ** (1 / values.length);
}
