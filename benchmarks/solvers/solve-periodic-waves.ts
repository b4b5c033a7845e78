import { nodesOf } from "../grids/grid-nodes";
import type { ProblemDefinition } from "../problems/definition";
import { fourierTransform, inverseFourierTransform, modeNumbers } from "../transforms/fourier-transform";
import { integrateInTime } from "./integrate-in-time";
import { type PeriodicScheme, periodicOperators } from "./periodic-scheme";
import { axisLength, finalTime, initialValues, namedExpression } from "./problem-data";
import type { SolvedRun } from "./reference-solver";

/**
 * Solve u_tt = u_xx from rest on a periodic axis, exactly in time: each mode oscillates with its own frequency.
 *
 * @param problem with u_t = 0 at the start
 * @param n nodes, one number
 * @param scheme gives the multiplier of the second derivative
 * @returns the values at the last output time
 * @example solveWave(problem, [64], centralScheme(2))
 * @see R. J. LeVeque, Finite Difference Methods, SIAM, 2007, section 10.1
 */
export function solveWave(problem: ProblemDefinition, n: number[], scheme: PeriodicScheme): SolvedRun {
  const [{ a, b }] = problem.axes;
  const [nodes] = n;
  const x = nodesOf("uniform-periodic", nodes, a, b);
  const h = axisLength(problem, 0) / nodes;
  const time = finalTime(problem) - problem.initialTime;
  const modes = fourierTransform(initialValues(problem, "u", 0, [x]).values, null);
  modeNumbers(nodes).forEach((mode, k) => {
    const factor = Math.cos((Math.sqrt(scheme.second((2 * Math.PI * mode) / nodes)) * time) / h);
    modes.re[k] *= factor;
    modes.im[k] *= factor;
  });
  const values = inverseFourierTransform(modes.re, modes.im).re;
  return { n, coordinates: [x], fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}

/**
 * Solve u_tt = u_xx - sin u on a periodic axis as a system of first order in time.
 *
 * @param problem with initial values of u and u_t
 * @param n nodes, one number
 * @param scheme gives the second derivative
 * @returns u at the last output time
 * @example solveSineGordon(problem, [256], fourierScheme)
 * @see M. J. Ablowitz, D. J. Kaup, A. C. Newell and H. Segur, Phys. Rev. Lett. 30 (1973) 1262-1264 (the equation)
 */
export function solveSineGordon(problem: ProblemDefinition, n: number[], scheme: PeriodicScheme): SolvedRun {
  const [{ a, b }] = problem.axes;
  const [nodes] = n;
  const x = nodesOf("uniform-periodic", nodes, a, b);
  const { second } = periodicOperators(scheme, nodes, axisLength(problem, 0) / nodes);
  const start = new Float64Array(2 * nodes);
  start.set(initialValues(problem, "u", 0, [x]).values);
  start.set(initialValues(problem, "u", 1, [x]).values, nodes);
  const f = (_t: number, state: Float64Array, out: Float64Array) => {
    const acceleration = out.subarray(nodes);
    out.set(state.subarray(nodes));
    second.apply(state.subarray(0, nodes), acceleration);
    for (let j = 0; j < nodes; j++) acceleration[j] -= Math.sin(state[j]);
  };
  const { u, steps } = integrateInTime(f, start, problem.initialTime, finalTime(problem));
  const dt = (finalTime(problem) - problem.initialTime) / steps;
  return { n, coordinates: [x], fields: { u: { values: u.slice(0, nodes), imaginary: null } }, dt, steps };
}

/**
 * Solve u_t + c(x) u_x = 0 on a periodic axis in advective form.
 *
 * @param problem with the named expression c
 * @param n nodes, one number
 * @param scheme gives the first derivative
 * @returns the values at the last output time
 * @example solveVariableAdvection(problem, [256], centralScheme(4))
 * @see L. N. Trefethen, Spectral Methods in MATLAB, SIAM, 2000, program 6
 */
export function solveVariableAdvection(
  problem: ProblemDefinition,
  n: number[],
  scheme: PeriodicScheme,
): SolvedRun {
  const [{ a, b }] = problem.axes;
  const x = nodesOf("uniform-periodic", n[0], a, b);
  const speed = namedExpression(problem, "c", [x])(problem.initialTime);
  const { first } = periodicOperators(scheme, n[0], axisLength(problem, 0) / n[0]);
  const f = (_t: number, u: Float64Array, out: Float64Array) => {
    first.apply(u, out);
    for (let j = 0; j < u.length; j++) out[j] *= -speed[j];
  };
  const start = initialValues(problem, "u", 0, [x]).values;
  const { u, steps } = integrateInTime(f, start, problem.initialTime, finalTime(problem));
  const dt = (finalTime(problem) - problem.initialTime) / steps;
  return { n, coordinates: [x], fields: { u: { values: u, imaginary: null } }, dt, steps };
}
