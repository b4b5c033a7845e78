import { nodesOf } from "../grids/grid-nodes";
import type { ProblemDefinition } from "../problems/definition";
import { type BoundedScheme, closedSecondDerivative } from "./bounded-scheme";
import type { DenseMatrix } from "./dense-matrix";
import { integrateInTime } from "./integrate-in-time";
import { endCondition, finalTime, initialValues, parameter } from "./problem-data";
import type { SolvedRun } from "./reference-solver";

/** Writes the reaction at u into out. */
type Reaction = (u: Float64Array, out: Float64Array) => void;

/**
 * Solve the Fisher equation u_t = u_xx + u (1 - u) on a bounded axis.
 *
 * @param problem with boundary data that may depend on time
 * @param n nodes, one number
 * @param scheme in space
 * @returns the values at the last output time
 * @example solveFisher(problem, [81], secondOrderScheme)
 * @see M. J. Ablowitz and A. Zeppetella, Bull. Math. Biol. 41 (1979) 835-840
 */
export function solveFisher(problem: ProblemDefinition, n: number[], scheme: BoundedScheme): SolvedRun {
  return solveReactionDiffusion(problem, n, scheme, (u, out) => {
    for (let j = 0; j < u.length; j++) out[j] = u[j] * (1 - u[j]);
  });
}

/**
 * Solve the bistable equation u_t = u_xx + u (1 - u)(u - alpha) on a bounded axis.
 *
 * @param problem with the parameter alpha
 * @param n nodes, one number
 * @param scheme in space
 * @returns the values at the last output time
 * @example solveBistable(problem, [81], chebyshevScheme)
 * @see K. P. Hadeler and F. Rothe, J. Math. Biol. 2 (1975) 251-263
 */
export function solveBistable(problem: ProblemDefinition, n: number[], scheme: BoundedScheme): SolvedRun {
  const alpha = parameter(problem, "alpha");
  return solveReactionDiffusion(problem, n, scheme, (u, out) => {
    for (let j = 0; j < u.length; j++) out[j] = u[j] * (1 - u[j]) * (u[j] - alpha);
  });
}

function solveReactionDiffusion(
  problem: ProblemDefinition,
  n: number[],
  scheme: BoundedScheme,
  reaction: Reaction,
): SolvedRun {
  const [{ a, b }] = problem.axes;
  const x = nodesOf(scheme.gridKind, n[0], a, b);
  const ends = { a: endCondition(problem, "x", "a"), b: endCondition(problem, "x", "b") };
  const { matrix, unknowns, dataColumns, extend } = closedSecondDerivative(scheme, n[0], a, b, ends);
  const start = initialValues(problem, "u", 0, [x]).values;
  const diffuse = scheme.kind === "chebyshev" ? denseProduct(matrix) : tridiagonalProduct(matrix);
  const diffusion = new Float64Array(unknowns.length);
  const f = (t: number, u: Float64Array, out: Float64Array) => {
    diffuse(u, diffusion);
    reaction(u, out);
    const [ga, gb] = [ends.a.g(t), ends.b.g(t)];
    for (let j = 0; j < u.length; j++)
      out[j] += diffusion[j] + ga * dataColumns[0][j] + gb * dataColumns[1][j];
  };
  const end = finalTime(problem);
  const inner = Float64Array.from(unknowns, (node) => start[node]);
  const { u, steps } = integrateInTime(f, inner, problem.initialTime, end);
  const values = extend(u, [ends.a.g(end), ends.b.g(end)]);
  const dt = (end - problem.initialTime) / steps;
  return { n, coordinates: [x], fields: { u: { values, imaginary: null } }, dt, steps };
}

function denseProduct({ size, values }: DenseMatrix) {
  return (u: Float64Array, out: Float64Array) => {
    for (let i = 0; i < size; i++) {
      let total = 0;
      for (let j = 0; j < size; j++) total += values[i * size + j] * u[j];
      out[i] = total;
    }
  };
}

function tridiagonalProduct({ size, values }: DenseMatrix) {
  return (u: Float64Array, out: Float64Array) => {
    for (let i = 0; i < size; i++) {
      const row = i * size + i;
      out[i] =
        values[row] * u[i] +
        (i > 0 ? values[row - 1] * u[i - 1] : 0) +
        (i < size - 1 ? values[row + 1] * u[i + 1] : 0);
    }
  };
}
