import { nodesOf } from "../grids/grid-nodes";
import { kinkPlaces } from "../problems/kinks";
import type { ProblemDefinition } from "../problems/definition";
import type { BoundedScheme } from "./bounded-scheme";
import { chebyshevMatrix, chebyshevSecondMatrix } from "./chebyshev-matrix";
import { denseMatrix, multiplyVector, solveDense } from "./dense-matrix";
import { integrateInTime } from "./integrate-in-time";
import { matrixExponential } from "./matrix-exponential";
import { finalTime, initialValues, namedExpression, parameter } from "./problem-data";
import type { SolvedRun } from "./reference-solver";
import { solveTridiagonal } from "./tridiagonal";

/**
 * Solve -(k u_x)_x = 1 with zero ends and a diffusivity that jumps.
 *
 * Second order samples k half-way between nodes; Chebyshev collocation applies -D(k D u) over the whole domain.
 *
 * @param problem with the named expression k
 * @param n nodes, one number
 * @param scheme of the two
 * @returns the solution
 * @example solveLayeredDiffusion(problem, [65], secondOrderScheme)
 * @see S. V. Patankar, Numerical Heat Transfer and Fluid Flow, 1980, section 4.2
 */
export function solveLayeredDiffusion(
  problem: ProblemDefinition,
  n: number[],
  scheme: BoundedScheme,
): SolvedRun {
  const [{ a, b }] = problem.axes;
  const x = nodesOf(scheme.gridKind, n[0], a, b);
  if (scheme.kind === "secondOrder") {
    const middles = Float64Array.from({ length: n[0] - 1 }, (_, j) => (x[j] + x[j + 1]) / 2);
    return layeredBalance(problem, x, namedExpression(problem, "k", [middles])(null));
  }
  const first = chebyshevMatrix(n[0], a, b).values;
  const k = namedExpression(problem, "k", [x])(null);
  const inner = n[0] - 2;
  const matrix = denseMatrix(inner, (i, j) => {
    let total = 0;
    for (let m = 0; m < n[0]; m++) total -= first[(i + 1) * n[0] + m] * k[m] * first[m * n[0] + j + 1];
    return total;
  });
  const values = new Float64Array(n[0]);
  values.set(solveDense(matrix, new Float64Array(inner).fill(1)), 1);
  return { n, coordinates: [x], fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}

/**
 * The same with the exact harmonic mean of k over each cell, which keeps second order.
 *
 * @param problem with the parameters k1, k2 and one kink, the interface
 * @param n nodes, one number
 * @returns the solution
 * @example solveLayeredDiffusionHarmonic(problem, [65])
 * @see S. V. Patankar, Numerical Heat Transfer and Fluid Flow, 1980, section 4.2
 */
export function solveLayeredDiffusionHarmonic(problem: ProblemDefinition, n: number[]): SolvedRun {
  const [{ a, b }] = problem.axes;
  const x = nodesOf("uniform", n[0], a, b);
  const [interfacePlace] = kinkPlaces(problem, null);
  const [k1, k2] = [parameter(problem, "k1"), parameter(problem, "k2")];
  const means = Float64Array.from({ length: n[0] - 1 }, (_, j) => {
    const left = Math.min(Math.max(interfacePlace - x[j], 0), x[j + 1] - x[j]);
    return (x[j + 1] - x[j]) / (left / k1 + (x[j + 1] - x[j] - left) / k2);
  });
  return layeredBalance(problem, x, means);
}

/** Fluxes between neighbours balance the source; the diffusivity is given between nodes. */
function layeredBalance(problem: ProblemDefinition, x: Float64Array, between: Float64Array): SolvedRun {
  const nodes = x.length;
  const [{ a, b }] = problem.axes;
  const square = ((b - a) / (nodes - 1)) ** 2;
  const inner = nodes - 2;
  const entry = (f: (j: number) => number) => Float64Array.from({ length: inner }, (_, j) => f(j) / square);
  const lower = entry((j) => -between[j]);
  const diagonal = entry((j) => between[j] + between[j + 1]);
  const upper = entry((j) => -between[j + 1]);
  const values = new Float64Array(nodes);
  values.set(solveTridiagonal(lower, diagonal, upper, new Float64Array(inner).fill(1)), 1);
  return { n: [nodes], coordinates: [x], fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}

/**
 * Solve u_tt = u_xx from rest with zero ends, exactly in time.
 *
 * Second order: by its sine modes. Chebyshev: by the exponential of the system for u and u_t.
 *
 * @param problem with u_t = 0 at the start
 * @param n nodes, one number
 * @param scheme of the two
 * @returns the values at the last output time
 * @example solveString(problem, [65], secondOrderScheme)
 * @see R. J. LeVeque, Finite Difference Methods, SIAM, 2007, section 2.10 (the modes)
 */
export function solveString(problem: ProblemDefinition, n: number[], scheme: BoundedScheme): SolvedRun {
  const [{ a, b }] = problem.axes;
  const x = nodesOf(scheme.gridKind, n[0], a, b);
  const start = initialValues(problem, "u", 0, [x]).values;
  const time = finalTime(problem) - problem.initialTime;
  const values =
    scheme.kind === "chebyshev" ? stringByExponential(start, a, b, time) : stringByModes(start, a, b, time);
  return { n, coordinates: [x], fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}

function stringByModes(start: Float64Array, a: number, b: number, time: number): Float64Array {
  const intervals = start.length - 1;
  const h = (b - a) / intervals;
  const sine = Float64Array.from({ length: 2 * intervals }, (_, k) => Math.sin((Math.PI * k) / intervals));
  const at = (k: number, j: number) => sine[(k * j) % (2 * intervals)];
  const out = new Float64Array(start.length);
  for (let k = 1; k < intervals; k++) {
    let amplitude = 0;
    for (let j = 1; j < intervals; j++) amplitude += (2 / intervals) * start[j] * at(k, j);
    const frequency = (2 / h) * Math.sin((Math.PI * k) / (2 * intervals));
    amplitude *= Math.cos(frequency * time);
    for (let j = 1; j < intervals; j++) out[j] += amplitude * at(k, j);
  }
  return out;
}

function stringByExponential(start: Float64Array, a: number, b: number, time: number): Float64Array {
  const nodes = start.length;
  const inner = nodes - 2;
  const second = chebyshevSecondMatrix(nodes, a, b).values;
  const system = denseMatrix(2 * inner, (i, j) => {
    if (i < inner) return j === i + inner ? time : 0;
    return j < inner ? time * second[(i - inner + 1) * nodes + j + 1] : 0;
  });
  const state = new Float64Array(2 * inner);
  state.set(start.subarray(1, nodes - 1));
  const out = new Float64Array(nodes);
  out.set(multiplyVector(matrixExponential(system), state).subarray(0, inner), 1);
  return out;
}

/**
 * Solve u_t = (u^m)_xx with zero ends by second differences of u^m.
 *
 * @param exponent m
 * @returns a solver of the problem with this exponent
 * @example porousMediumSolver(2)(problem, [121], secondOrderScheme)
 * @see J. L. Vazquez, The Porous Medium Equation, Oxford, 2007 (the equation)
 */
export function porousMediumSolver(exponent: number) {
  return (problem: ProblemDefinition, n: number[]): SolvedRun => {
    const [{ a, b }] = problem.axes;
    const x = nodesOf("uniform", n[0], a, b);
    const h = (b - a) / (n[0] - 1);
    const power = new Float64Array(n[0]);
    const f = (_t: number, u: Float64Array, out: Float64Array) => {
      for (let j = 0; j < u.length; j++) power[j] = u[j] ** exponent;
      for (let j = 1; j < u.length - 1; j++) out[j] = (power[j - 1] - 2 * power[j] + power[j + 1]) / (h * h);
      out[0] = 0;
      out[u.length - 1] = 0;
    };
    const start = initialValues(problem, "u", 0, [x]).values;
    // The front leaves errors of 1e-4 at best: tighter steps would only follow its corner from cell to cell.
    const tolerances = { relative: 1e-9, absolute: 1e-12 };
    const { u, steps } = integrateInTime(f, start, problem.initialTime, finalTime(problem), tolerances);
    const dt = (finalTime(problem) - problem.initialTime) / steps;
    return { n, coordinates: [x], fields: { u: { values: u, imaginary: null } }, dt, steps };
  };
}
