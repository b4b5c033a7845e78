import { nodesOf } from "../grids/grid-nodes";
import type { ProblemDefinition } from "../problems/definition";
import type { ComplexArray } from "../transforms/fourier-plan";
import { fourierTransform2d, modeNumbers } from "../transforms/fourier-transform";
import { integrateInTime } from "./integrate-in-time";
import type { PeriodicScheme } from "./periodic-scheme";
import { axisLength, finalTime, initialValues, parameter } from "./problem-data";
import type { SolvedRun } from "./reference-solver";

/** Multipliers of the derivatives along one axis, by mode. */
interface Symbols {
  first: Float64Array;
  second: Float64Array;
}

/**
 * Solve the vorticity equation of two-dimensional incompressible flow on a doubly periodic square, advective form.
 *
 * The stream function comes from the vorticity by division with the scheme's own second derivatives.
 *
 * @param problem with the parameters U, V (mean velocity) and nu
 * @param n nodes along x and y
 * @param scheme gives the multipliers of both derivatives
 * @returns the vorticity at the last output time
 * @example solveVorticity(problem, [32, 32], centralScheme(4))
 * @see C. Canuto et al., Spectral Methods: Evolution to Complex Geometries, Springer, 2007, section 3.3 (from memory)
 */
export function solveVorticity(problem: ProblemDefinition, n: number[], scheme: PeriodicScheme): SolvedRun {
  const shape = [n[0], n[1]] as const;
  const coordinates = problem.axes.map(({ a, b }, axis) => nodesOf("uniform-periodic", n[axis], a, b));
  const [alongX, alongY] = n.map((nodes, axis) =>
    symbolsOf(scheme, nodes, axisLength(problem, axis) / nodes),
  );
  const [meanU, meanV, nu] = ["U", "V", "nu"].map((name) => parameter(problem, name));
  const start = initialValues(problem, "u", 0, coordinates).values;
  const zero = new Float64Array(start.length);
  const f = (_t: number, u: Float64Array, out: Float64Array) => {
    const modes = fourierTransform2d({ re: u, im: zero }, shape, false);
    const parts = derivedModes(modes, alongX, alongY);
    // Two real fields travel through one inverse transform as its real and imaginary part.
    const slopes = fourierTransform2d(parts.slopes, shape, true);
    const stream = fourierTransform2d(parts.stream, shape, true);
    const laplacian = fourierTransform2d(parts.laplacian, shape, true).re;
    for (let k = 0; k < out.length; k++) {
      const advection = (meanU + stream.im[k]) * slopes.re[k] + (meanV - stream.re[k]) * slopes.im[k];
      out[k] = nu * laplacian[k] - advection;
    }
  };
  const { u, steps } = integrateInTime(f, start, problem.initialTime, finalTime(problem));
  const dt = (finalTime(problem) - problem.initialTime) / steps;
  return { n, coordinates, fields: { u: { values: u, imaginary: null } }, dt, steps };
}

function symbolsOf(scheme: PeriodicScheme, nodes: number, h: number): Symbols {
  const angles = modeNumbers(nodes).map((mode) => (2 * Math.PI * mode) / nodes);
  return {
    first: angles.map((theta) => scheme.first(theta) / h),
    second: angles.map((theta) => scheme.second(theta) / (h * h)),
  };
}

/** u_x + i u_y, psi_x + i psi_y and the Laplacian of u, in Fourier space. */
function derivedModes(modes: ComplexArray, alongX: Symbols, alongY: Symbols) {
  const size = modes.re.length;
  const columns = alongY.first.length;
  const empty = (): ComplexArray => ({ re: new Float64Array(size), im: new Float64Array(size) });
  const [slopes, stream, laplacian] = [empty(), empty(), empty()];
  for (let k = 0; k < size; k++) {
    const [i, j] = [Math.floor(k / columns), k % columns];
    const [dx, dy] = [alongX.first[i], alongY.first[j]];
    const minusLaplacian = alongX.second[i] + alongY.second[j];
    const [re, im] = [modes.re[k], modes.im[k]];
    // i dx u + i (i dy u) = (i dx - dy) u.
    slopes.re[k] = -dx * im - dy * re;
    slopes.im[k] = dx * re - dy * im;
    const inverse = minusLaplacian === 0 ? 0 : 1 / minusLaplacian;
    stream.re[k] = slopes.re[k] * inverse;
    stream.im[k] = slopes.im[k] * inverse;
    laplacian.re[k] = -minusLaplacian * re;
    laplacian.im[k] = -minusLaplacian * im;
  }
  return { slopes, stream, laplacian };
}
