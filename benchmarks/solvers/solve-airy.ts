import { nodesOf } from "../grids/grid-nodes";
import type { ProblemDefinition } from "../problems/definition";
import { type BoundedScheme, closedSecondDerivative } from "./bounded-scheme";
import { denseMatrix, solveDense } from "./dense-matrix";
import { endCondition, parameter } from "./problem-data";
import type { SolvedRun } from "./reference-solver";

/**
 * Solve u_xx - lambda^3 x u = 0 with values given at both ends, directly.
 *
 * The matrix is indefinite where the solution oscillates, so the elimination pivots.
 *
 * @param problem with the parameter lambda
 * @param n nodes, one number
 * @param scheme of the two
 * @returns the solution
 * @example solveAiry(problem, [129], secondOrderScheme)
 * @see C. M. Bender and S. A. Orszag, Advanced Mathematical Methods for Scientists and Engineers, 1978, section 3.5
 */
export function solveAiry(problem: ProblemDefinition, n: number[], scheme: BoundedScheme): SolvedRun {
  const [{ a, b }] = problem.axes;
  const x = nodesOf(scheme.gridKind, n[0], a, b);
  const cube = parameter(problem, "lambda") ** 3;
  const ends = { a: endCondition(problem, "x", "a"), b: endCondition(problem, "x", "b") };
  const data = [ends.a.g(0), ends.b.g(0)] as const;
  const { matrix, unknowns, dataColumns, extend } = closedSecondDerivative(scheme, n[0], a, b, ends);
  const { size } = matrix;
  const system = denseMatrix(
    size,
    (i, j) => matrix.values[i * size + j] - (i === j ? cube * x[unknowns[i]] : 0),
  );
  const right = dataColumns[0].map((column, j) => -data[0] * column - data[1] * dataColumns[1][j]);
  const values = extend(solveDense(system, right), data);
  return { n, coordinates: [x], fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}
