import { nodesOf } from "../grids/grid-nodes";
import type { ProblemDefinition } from "../problems/definition";
import { cosineTransform } from "../transforms/cosine-transform";
import { type BoundedScheme, closedSecondDerivative } from "./bounded-scheme";
import { chebyshevMatrix, chebyshevSecondMatrix } from "./chebyshev-matrix";
import { denseMatrix, multiplyVector, solveDense } from "./dense-matrix";
import { matrixExponential } from "./matrix-exponential";
import { endCondition, finalTime, initialValues, namedExpression, parameter } from "./problem-data";
import type { SolvedRun } from "./reference-solver";
import { solveTridiagonal } from "./tridiagonal";

/**
 * Solve the heat equation with homogeneous end conditions, exactly in time by the matrix exponential.
 *
 * @param problem u_t = u_xx on a bounded axis
 * @param n nodes, one number
 * @param scheme in space
 * @returns the values at the last output time
 * @example solveHeat(problem, [33], secondOrderScheme)
 * @see C. Moler and C. Van Loan, Nineteen dubious ways to compute the exponential of a matrix, SIAM Rev. 45 (2003) 3-49
 */
export function solveHeat(problem: ProblemDefinition, n: number[], scheme: BoundedScheme): SolvedRun {
  const [{ a, b }] = problem.axes;
  const x = nodesOf(scheme.gridKind, n[0], a, b);
  const ends = { a: endCondition(problem, "x", "a"), b: endCondition(problem, "x", "b") };
  const { matrix, unknowns, extend } = closedSecondDerivative(scheme, n[0], a, b, ends);
  const time = finalTime(problem) - problem.initialTime;
  const start = initialValues(problem, "u", 0, [x]).values;
  const inner = Float64Array.from(unknowns, (node) => start[node]);
  const propagator = matrixExponential({
    size: matrix.size,
    values: matrix.values.map((value) => value * time),
  });
  const values = extend(multiplyVector(propagator, inner));
  return { n, coordinates: [x], fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}

/**
 * Solve -eps u_xx + u_x = 1 with zero ends directly.
 *
 * @param problem with the parameter eps
 * @param n nodes, one number
 * @param scheme central differences of second order, or Chebyshev collocation
 * @returns the solution
 * @example solveBoundaryLayer(problem, [65], secondOrderScheme)
 * @see R. J. LeVeque 2007, section 2.17
 */
export function solveBoundaryLayer(
  problem: ProblemDefinition,
  n: number[],
  scheme: BoundedScheme,
): SolvedRun {
  const [{ a, b }] = problem.axes;
  const [nodes] = n;
  const eps = parameter(problem, "eps");
  const inner = nodes - 2;
  const x = nodesOf(scheme.gridKind, nodes, a, b);
  const right = new Float64Array(inner).fill(1);
  const values = new Float64Array(nodes);
  if (scheme.kind === "chebyshev") {
    const first = chebyshevMatrix(nodes, a, b).values;
    const second = chebyshevSecondMatrix(nodes, a, b).values;
    const at = (i: number, j: number) => (i + 1) * nodes + j + 1;
    const matrix = denseMatrix(inner, (i, j) => first[at(i, j)] - eps * second[at(i, j)]);
    values.set(solveDense(matrix, right), 1);
  } else {
    const h = (b - a) / (nodes - 1);
    const [below, centre, above] = [
      -eps / (h * h) - 1 / (2 * h),
      (2 * eps) / (h * h),
      -eps / (h * h) + 1 / (2 * h),
    ];
    const row = (value: number) => new Float64Array(inner).fill(value);
    values.set(solveTridiagonal(row(below), row(centre), row(above), right), 1);
  }
  return { n, coordinates: [x], fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}

/**
 * Solve -u_xx - u_yy = f with Neumann sides in x and zero sides in y directly.
 *
 * Second order: ghost points make the x part diagonal in cosines; one tridiagonal system in y for each of them.
 * Chebyshev: one dense system for the inner nodes, by Kronecker products.
 *
 * @param problem with the named expression f, taken at the nodes
 * @param n nodes along x and y
 * @param scheme of the two
 * @returns the solution
 * @example solveMixedPoisson(problem, [33, 33], secondOrderScheme)
 * @see B. L. Buzbee, G. H. Golub and C. W. Nielson, On direct methods for solving Poisson's equations, SIAM J. Numer.
 *   Anal. 7 (1970) 627-656; Trefethen 2000, program 16
 */
export function solveMixedPoisson(problem: ProblemDefinition, n: number[], scheme: BoundedScheme): SolvedRun {
  const coordinates = problem.axes.map(({ a, b }, axis) => nodesOf(scheme.gridKind, n[axis], a, b));
  const f = namedExpression(problem, "f", coordinates)(null);
  const values =
    scheme.kind === "chebyshev"
      ? poissonByCollocation(problem, n, scheme, f)
      : poissonByCosines(problem, n, f);
  return { n, coordinates, fields: { u: { values, imaginary: null } }, dt: null, steps: null };
}

function poissonByCosines(problem: ProblemDefinition, n: number[], f: Float64Array): Float64Array {
  const [rows, columns] = n;
  const [hx, hy] = problem.axes.map(({ a, b }, axis) => (b - a) / (n[axis] - 1));
  const inner = columns - 2;
  const modes = transformAlongX(f, rows, columns);
  const row = (value: number) => new Float64Array(inner).fill(value);
  for (let k = 0; k < rows; k++) {
    const symbol = (4 * Math.sin((Math.PI * k) / (2 * (rows - 1))) ** 2) / (hx * hx);
    const right = modes.slice(k * columns + 1, (k + 1) * columns - 1);
    const side = row(-1 / (hy * hy));
    const solution = solveTridiagonal(side, row(symbol + 2 / (hy * hy)), side, right);
    modes.fill(0, k * columns, (k + 1) * columns);
    modes.set(solution, k * columns + 1);
  }
  return transformAlongX(modes, rows, columns).map((value) => value / (2 * (rows - 1)));
}

function transformAlongX(values: Float64Array, rows: number, columns: number): Float64Array {
  const out = new Float64Array(values.length);
  for (let j = 0; j < columns; j++) {
    const column = cosineTransform(Float64Array.from({ length: rows }, (_, i) => values[i * columns + j]));
    for (let i = 0; i < rows; i++) out[i * columns + j] = column[i];
  }
  return out;
}

function poissonByCollocation(
  problem: ProblemDefinition,
  n: number[],
  scheme: BoundedScheme,
  f: Float64Array,
): Float64Array {
  const [rows, columns] = n;
  const [x, y] = problem.axes.map(({ name, a, b }, axis) =>
    closedSecondDerivative(scheme, n[axis], a, b, {
      a: endCondition(problem, name, "a"),
      b: endCondition(problem, name, "b"),
    }),
  );
  const [sizeX, sizeY] = [x.unknowns.length, y.unknowns.length];
  const matrix = denseMatrix(sizeX * sizeY, (p, q) => {
    const [i, j, k, l] = [Math.floor(p / sizeY), p % sizeY, Math.floor(q / sizeY), q % sizeY];
    return -(j === l ? x.matrix.values[i * sizeX + k] : 0) - (i === k ? y.matrix.values[j * sizeY + l] : 0);
  });
  const right = Float64Array.from({ length: sizeX * sizeY }, (_, p) => {
    const [i, j] = [x.unknowns[Math.floor(p / sizeY)], y.unknowns[p % sizeY]];
    return f[i * columns + j];
  });
  const inner = solveDense(matrix, right);
  const out = new Float64Array(rows * columns);
  const alongY = x.unknowns.map((_, i) => y.extend(inner.subarray(i * sizeY, (i + 1) * sizeY)));
  for (let j = 0; j < columns; j++) {
    const column = x.extend(Float64Array.from(alongY, (line) => line[j]));
    for (let i = 0; i < rows; i++) out[i * columns + j] = column[i];
  }
  return out;
}
