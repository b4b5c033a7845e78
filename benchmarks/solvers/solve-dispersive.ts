import { nodesOf } from "../grids/grid-nodes";
import type { ProblemDefinition } from "../problems/definition";
import type { ComplexArray } from "../transforms/fourier-plan";
import { fourierTransform, inverseFourierTransform, modeNumbers } from "../transforms/fourier-transform";
import { integrateInTime, type Tolerances } from "./integrate-in-time";
import { type PeriodicScheme, periodicOperators } from "./periodic-scheme";
import { axisLength, finalTime, initialValues } from "./problem-data";
import type { SolvedRun } from "./reference-solver";

/** Time errors far below the spatial error: of difference schemes about 1e-6 at best on the grids suggested. */
function tolerancesFor(scheme: PeriodicScheme, largest: number): Tolerances {
  const relative = scheme.stencils ? 1e-9 : 1e-12;
  return { relative, absolute: relative * largest };
}

/**
 * Solve u_t + 6 u u_x + u_xxx = 0 as u_t = -3 D1(u^2) - D3 u on a periodic axis.
 *
 * The linear term is exact through an integrating factor in Fourier space; the other is integrated in time.
 *
 * @param problem with initial values of u
 * @param n nodes, one number
 * @param scheme gives the multipliers of the first and the third derivative
 * @returns the values at the last output time
 * @throws RangeError where the scheme has no third derivative
 * @example solveKortewegDeVries(problem, [128], fourierScheme)
 * @see B. Fornberg and G. B. Whitham, Phil. Trans. R. Soc. A 289 (1978) 373-404; Trefethen 2000, program 27
 */
export function solveKortewegDeVries(
  problem: ProblemDefinition,
  n: number[],
  scheme: PeriodicScheme,
): SolvedRun {
  const [{ a, b }] = problem.axes;
  const [nodes] = n;
  const x = nodesOf("uniform-periodic", nodes, a, b);
  const from = problem.initialTime;
  const start = fourierTransform(initialValues(problem, "u", 0, [x]).values, null);
  const system = new TurnedModes(scheme, nodes, axisLength(problem, 0) / nodes, from);
  const state = system.pack(start);
  const largest = state.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const f = (t: number, u: Float64Array, out: Float64Array) => system.slope(t, u, out);
  const { u, steps } = integrateInTime(f, state, from, finalTime(problem), tolerancesFor(scheme, largest));
  const values = system.values(finalTime(problem), u);
  const dt = (finalTime(problem) - from) / steps;
  return { n, coordinates: [x], fields: { u: { values, imaginary: null } }, dt, steps };
}

/** Modes 0..n/2 of real data, each turned back by the angle that the linear term has turned it. */
class TurnedModes {
  private readonly half: number;
  private readonly factor: Float64Array;
  private readonly frequency: Float64Array;
  private readonly cosine: Float64Array;
  private readonly sine: Float64Array;

  constructor(
    scheme: PeriodicScheme,
    private readonly nodes: number,
    h: number,
    private readonly from: number,
  ) {
    const { third } = scheme;
    if (!third) throw new RangeError("the scheme has no formula for the third derivative");
    this.half = Math.floor(nodes / 2) + 1;
    const angles = Float64Array.from({ length: this.half }, (_, mode) => (2 * Math.PI * mode) / nodes);
    this.factor = angles.map((theta) => (3 * scheme.first(theta)) / h);
    this.frequency = angles.map((theta) => third(theta) / h ** 3);
    this.cosine = new Float64Array(this.half);
    this.sine = new Float64Array(this.half);
  }

  pack({ re, im }: ComplexArray): Float64Array {
    const state = new Float64Array(2 * this.half);
    state.set(re.subarray(0, this.half));
    state.set(im.subarray(0, this.half), this.half);
    return state;
  }

  values(t: number, state: Float64Array): Float64Array {
    const { half, nodes, frequency, cosine, sine } = this;
    const re = new Float64Array(nodes);
    const im = new Float64Array(nodes);
    for (let k = 0; k < half; k++) {
      cosine[k] = Math.cos(frequency[k] * (t - this.from));
      sine[k] = Math.sin(frequency[k] * (t - this.from));
      re[k] = state[k] * cosine[k] - state[half + k] * sine[k];
      im[k] = state[k] * sine[k] + state[half + k] * cosine[k];
    }
    for (let k = half; k < nodes; k++) {
      re[k] = re[nodes - k];
      im[k] = -im[nodes - k];
    }
    return inverseFourierTransform(re, im).re;
  }

  /** -3 i w times the modes of u^2, turned back. */
  slope(t: number, state: Float64Array, out: Float64Array): void {
    const { half, factor, cosine, sine } = this;
    const u = this.values(t, state);
    for (let j = 0; j < u.length; j++) u[j] *= u[j];
    const square = fourierTransform(u, null);
    for (let k = 0; k < half; k++) {
      const re = factor[k] * square.im[k];
      const im = -factor[k] * square.re[k];
      out[k] = re * cosine[k] + im * sine[k];
      out[half + k] = im * cosine[k] - re * sine[k];
    }
  }
}

/**
 * Solve i u_t + u_xx + 2 |u|^2 u = 0 on a periodic axis; the state holds real and imaginary part.
 *
 * @param problem with complex initial values of u
 * @param n nodes, one number
 * @param scheme gives the second derivative
 * @returns the values at the last output time
 * @example solveSchroedinger(problem, [256], fourierScheme)
 * @see T. R. Taha and M. J. Ablowitz, J. Comput. Phys. 55 (1984) 203-230
 */
export function solveSchroedinger(
  problem: ProblemDefinition,
  n: number[],
  scheme: PeriodicScheme,
): SolvedRun {
  const [{ a, b }] = problem.axes;
  const [nodes] = n;
  const x = nodesOf("uniform-periodic", nodes, a, b);
  const start = initialValues(problem, "u", 0, [x]);
  const state = new Float64Array(2 * nodes);
  state.set(start.values);
  if (start.imaginary) state.set(start.imaginary, nodes);
  const bend = secondDerivativeOfParts(scheme, nodes, axisLength(problem, 0) / nodes);
  const f = (_t: number, u: Float64Array, out: Float64Array) => {
    const { re, im } = bend(u);
    for (let j = 0; j < nodes; j++) {
      const p = u[j];
      const q = u[nodes + j];
      const size = 2 * (p * p + q * q);
      out[j] = -im[j] - size * q;
      out[nodes + j] = re[j] + size * p;
    }
  };
  const tolerances = tolerancesFor(scheme, 1);
  const { u, steps } = integrateInTime(f, state, problem.initialTime, finalTime(problem), tolerances);
  const dt = (finalTime(problem) - problem.initialTime) / steps;
  const fields = { u: { values: u.slice(0, nodes), imaginary: u.slice(nodes) } };
  return { n, coordinates: [x], fields, dt, steps };
}

/** The second derivative of both parts: by stencil where there is one, else both at once in Fourier space. */
function secondDerivativeOfParts(
  scheme: PeriodicScheme,
  nodes: number,
  h: number,
): (u: Float64Array) => ComplexArray {
  if (scheme.stencils) {
    const { second } = periodicOperators(scheme, nodes, h);
    const out = { re: new Float64Array(nodes), im: new Float64Array(nodes) };
    return (u) => {
      second.apply(u.subarray(0, nodes), out.re);
      second.apply(u.subarray(nodes), out.im);
      return out;
    };
  }
  const symbol = modeNumbers(nodes).map((mode) => -scheme.second((2 * Math.PI * mode) / nodes) / (h * h));
  return (u) => {
    const modes = fourierTransform(u.subarray(0, nodes), u.subarray(nodes));
    for (let k = 0; k < nodes; k++) {
      modes.re[k] *= symbol[k];
      modes.im[k] *= symbol[k];
    }
    return inverseFourierTransform(modes.re, modes.im);
  };
}
