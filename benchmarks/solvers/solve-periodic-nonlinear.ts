import { nodesOf } from "../grids/grid-nodes";
import type { ProblemDefinition } from "../problems/definition";
import { integrateInTime, type RightHandSide } from "./integrate-in-time";
import { type PeriodicScheme, periodicOperators } from "./periodic-scheme";
import { axisLength, finalTime, initialValues, namedExpression, parameter } from "./problem-data";
import type { SolvedRun } from "./reference-solver";

/**
 * Solve the viscous Burgers equation u_t = -D1(u^2/2) + nu D2 u on a periodic axis; nothing is dealiased.
 *
 * @param problem with the parameter nu
 * @param n nodes, one number
 * @param scheme gives D1 and D2
 * @returns the values at the last output time
 * @example solveBurgers(problem, [64], fourierScheme)
 * @see C. Canuto et al., Spectral Methods: Fundamentals in Single Domains, Springer, 2006, section 3.3
 */
export function solveBurgers(problem: ProblemDefinition, n: number[], scheme: PeriodicScheme): SolvedRun {
  const nu = parameter(problem, "nu");
  const { first, second } = periodicOperators(scheme, n[0], axisLength(problem, 0) / n[0]);
  const flux = new Float64Array(n[0]);
  const slope = new Float64Array(n[0]);
  return integratePeriodic(problem, n, (_t, u, out) => {
    for (let j = 0; j < u.length; j++) flux[j] = (u[j] * u[j]) / 2;
    first.apply(flux, slope);
    second.apply(u, out);
    for (let j = 0; j < u.length; j++) out[j] = nu * out[j] - slope[j];
  });
}

/**
 * Solve u_t = (k(u) u_x)_x + f with k = 1 + u^2 on a periodic axis.
 *
 * Second order: fluxes at half points with k averaged there. Otherwise D1(k D1 u).
 *
 * @param problem with the named expression f
 * @param n nodes, one number
 * @param scheme gives D1
 * @returns the values at the last output time
 * @example solveNonlinearDiffusion(problem, [64], centralScheme(2))
 * @see R. J. LeVeque, Finite Difference Methods, SIAM, 2007, section 2.15 (fluxes at half points)
 */
export function solveNonlinearDiffusion(
  problem: ProblemDefinition,
  n: number[],
  scheme: PeriodicScheme,
): SolvedRun {
  const [{ a, b }] = problem.axes;
  const source = namedExpression(problem, "f", [nodesOf("uniform-periodic", n[0], a, b)]);
  const h = axisLength(problem, 0) / n[0];
  const isSecondOrder = scheme.stencils?.first.length === 3;
  const divergence = isSecondOrder ? compactDivergence(n[0], h) : wideDivergence(n[0], h, scheme);
  return integratePeriodic(problem, n, (t, u, out) => {
    divergence(u, out);
    const f = source(t);
    for (let j = 0; j < u.length; j++) out[j] += f[j];
  });
}

type Divergence = (u: Float64Array, out: Float64Array) => void;

function compactDivergence(n: number, h: number): Divergence {
  const flux = new Float64Array(n);
  return (u, out) => {
    for (let j = 0; j < n; j++) {
      const next = u[(j + 1) % n];
      const diffusivity = 1 + (u[j] * u[j] + next * next) / 2;
      flux[j] = (diffusivity * (next - u[j])) / h;
    }
    for (let j = 0; j < n; j++) out[j] = (flux[j] - flux[(j + n - 1) % n]) / h;
  };
}

function wideDivergence(n: number, h: number, scheme: PeriodicScheme): Divergence {
  const { first } = periodicOperators(scheme, n, h);
  const flux = new Float64Array(n);
  return (u, out) => {
    first.apply(u, flux);
    for (let j = 0; j < n; j++) flux[j] *= 1 + u[j] * u[j];
    first.apply(flux, out);
  };
}

function integratePeriodic(problem: ProblemDefinition, n: number[], f: RightHandSide): SolvedRun {
  const [{ a, b }] = problem.axes;
  const x = nodesOf("uniform-periodic", n[0], a, b);
  const start = initialValues(problem, "u", 0, [x]).values;
  const { u, steps } = integrateInTime(f, start, problem.initialTime, finalTime(problem));
  const dt = (finalTime(problem) - problem.initialTime) / steps;
  return { n, coordinates: [x], fields: { u: { values: u, imaginary: null } }, dt, steps };
}
