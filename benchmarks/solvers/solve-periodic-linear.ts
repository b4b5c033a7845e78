import { nodesOf } from "../grids/grid-nodes";
import type { ProblemDefinition } from "../problems/definition";
import {
  fourierTransform,
  fourierTransform2d,
  inverseFourierTransform,
  modeNumbers,
} from "../transforms/fourier-transform";
import type { PeriodicScheme } from "./periodic-scheme";
import { axisLength, finalTime, initialValues, namedExpression, parameter } from "./problem-data";
import type { SolvedRun } from "./reference-solver";

/**
 * Solve u_t + c u_x = nu u_xx on a periodic axis, exactly in time: each Fourier mode is multiplied once.
 *
 * @param problem with the parameter c, and nu where it diffuses
 * @param n nodes, one number
 * @param scheme gives the multipliers of both derivatives
 * @returns the values at the last output time
 * @example solveAdvectionDiffusion(problem, [64], centralScheme(4))
 * @see Kreiss and Oliger, Tellus 24 (1972) 199-215 (semi-discrete advection)
 */
export function solveAdvectionDiffusion(
  problem: ProblemDefinition,
  n: number[],
  scheme: PeriodicScheme,
): SolvedRun {
  const [{ a, b }] = problem.axes;
  const [nodes] = n;
  const x = nodesOf("uniform-periodic", nodes, a, b);
  const h = axisLength(problem, 0) / nodes;
  const c = parameter(problem, "c");
  const nu = problem.parameters.some(({ name }) => name === "nu") ? parameter(problem, "nu") : 0;
  const time = finalTime(problem) - problem.initialTime;
  const modes = fourierTransform(initialValues(problem, "u", 0, [x]).values, null);
  modeNumbers(nodes).forEach((mode, k) => {
    const theta = (2 * Math.PI * mode) / nodes;
    const size = Math.exp((-nu * scheme.second(theta) * time) / (h * h));
    const angle = (-c * scheme.first(theta) * time) / h;
    const [cosine, sine] = [size * Math.cos(angle), size * Math.sin(angle)];
    const re = modes.re[k] * cosine - modes.im[k] * sine;
    modes.im[k] = modes.re[k] * sine + modes.im[k] * cosine;
    modes.re[k] = re;
  });
  const values = inverseFourierTransform(modes.re, modes.im).re;
  return { n, coordinates: [x], fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}

/**
 * Solve -u_xx - u_yy + kappa u = f on a doubly periodic rectangle by division in Fourier space.
 *
 * @param problem with the parameter kappa and the named expression f, taken at the nodes
 * @param n nodes along x and y
 * @param scheme gives the multiplier of the second derivative
 * @returns the solution
 * @example solvePeriodicHelmholtz(problem, [64, 64], fourierScheme)
 * @see R. W. Hockney, A fast direct solution of Poisson's equation using Fourier analysis, J. ACM 12 (1965) 95-113
 */
export function solvePeriodicHelmholtz(
  problem: ProblemDefinition,
  n: number[],
  scheme: PeriodicScheme,
): SolvedRun {
  const coordinates = problem.axes.map(({ a, b }, axis) => nodesOf("uniform-periodic", n[axis], a, b));
  const [rows, columns] = n;
  const f = namedExpression(problem, "f", coordinates)(null);
  const kappa = parameter(problem, "kappa");
  const [alongX, alongY] = n.map((nodes, axis) => {
    const h = axisLength(problem, axis) / nodes;
    return modeNumbers(nodes).map((mode) => scheme.second((2 * Math.PI * mode) / nodes) / (h * h));
  });
  const modes = fourierTransform2d({ re: f, im: new Float64Array(f.length) }, [rows, columns], false);
  for (let i = 0; i < rows; i++) {
    for (let j = 0; j < columns; j++) {
      const symbol = kappa + alongX[i] + alongY[j];
      modes.re[i * columns + j] /= symbol;
      modes.im[i * columns + j] /= symbol;
    }
  }
  const values = fourierTransform2d(modes, [rows, columns], true).re;
  return { n, coordinates, fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}
