import { describe, expect, it } from "vitest";

import { normsOf, sumErrors } from "@/benchmarks/norms/error-norms";
import { shippedProblem, shippedProblems } from "@/benchmarks/problems/catalogue";
import { evaluateExact } from "@/benchmarks/problems/exact-solution";
import { weightsOf } from "@/benchmarks/quadrature/quadrature-weights";
import { integrateInTime } from "@/benchmarks/solvers/integrate-in-time";
import { centralScheme, compactScheme } from "@/benchmarks/solvers/periodic-scheme";
import { referenceSolver, referenceSolvers } from "@/benchmarks/solvers/reference-solvers";
import type { SolvedRun } from "@/benchmarks/solvers/reference-solver";

function errorOf(solverSlug: string, problemSlug: string, run: SolvedRun): number {
  const problem = shippedProblem(problemSlug);
  const kinds = referenceSolver(solverSlug).gridKinds(problemSlug);
  const t = problem.outputTimes.at(-1) ?? null;
  const weights = problem.axes.map(({ a, b }, axis) => weightsOf(kinds[axis], run.coordinates[axis], a, b));
  const fields = problem.fields.filter(({ isScored }) => isScored);
  const sums = fields.map(({ name }) =>
    sumErrors(run.fields[name], evaluateExact(problem, name, t, run.coordinates), weights),
  );
  return normsOf(sums).relL2 ?? NaN;
}

const pairs = referenceSolvers.flatMap((solver) =>
  solver.problems.map((problem) => [solver.slug, problem] as const),
);

describe.each(pairs)("%s on %s", (solverSlug, problemSlug) => {
  const solver = referenceSolver(solverSlug);
  const problem = shippedProblem(problemSlug);
  const sequence = solver.suggestedNodes(problemSlug);

  it("suggests a study of at least five grids on kinds that the problem allows", () => {
    expect(sequence.length).toBeGreaterThanOrEqual(5);
    expect(sequence.length).toBeLessThanOrEqual(24);
    solver.gridKinds(problemSlug).forEach((kind, axis) => expect(problem.grids.kinds[axis]).toContain(kind));
    sequence.forEach((n) => expect(n).toHaveLength(problem.axes.length));
  });

  it("converges on its suggested grids as it claims", () => {
    const [coarse, fine] = solver.claim.kind === "algebraic" ? sequence.slice(-2) : sequence.slice(0, 3);
    const [first, second] = [coarse, fine].map((n) =>
      errorOf(solverSlug, problemSlug, solver.solve(problem, n)),
    );
    expect(second).toBeLessThan(first);
    const isBounded = problem.classification.domain === "bounded";
    const ratio = isBounded ? (fine[0] - 1) / (coarse[0] - 1) : fine[0] / coarse[0];
    const order = Math.log(first / second) / Math.log(ratio);
    const { kind } = problem.classification.smoothness;
    const isSmooth = kind === "entire" || kind === "analytic";
    if (solver.claim.kind === "algebraic" && isSmooth)
      expect(order).toBeGreaterThan(solver.claim.order - 0.75);
  });
});

it("every shipped problem has reference solvers", () => {
  for (const { slug } of shippedProblems) {
    expect(referenceSolvers.some(({ problems }) => problems.includes(slug))).toBe(true);
  }
});

it("solves only its own problems, on as many axes as they have", () => {
  const solver = referenceSolver("house-cheb");
  expect(() => solver.solve(shippedProblem("advection-exp-sine"), [16])).toThrow(/does not solve/);
  expect(() => solver.solve(shippedProblem("heat-dirichlet"), [8, 8])).toThrow(RangeError);
  expect(() => referenceSolver("no-such-solver")).toThrow(RangeError);
});

describe("semi-discrete solutions in closed form are reproduced", () => {
  // LeVeque, Finite Difference Methods, SIAM, 2007, chapters 2, 3 and 9 (from memory); each follows by substitution.
  it("of the heat equation in second order", () => {
    const n = 33;
    const h = 1 / (n - 1);
    const { fields, coordinates } = referenceSolver("house-fd2").solve(shippedProblem("heat-dirichlet"), [n]);
    const amplitude = Math.exp((-4 / (h * h)) * Math.sin((Math.PI * h) / 2) ** 2 * 0.1);
    coordinates[0].forEach((x, j) => {
      expect(Math.abs(fields.u.values[j] - amplitude * Math.sin(Math.PI * x))).toBeLessThan(1e-12);
    });
  });

  it("of the boundary layer in second order", () => {
    const n = 65;
    const peclet = 1 / (n - 1) / 0.1;
    const r = (1 + peclet) / (1 - peclet);
    const { fields, coordinates } = referenceSolver("house-fd2").solve(shippedProblem("boundary-layer"), [n]);
    coordinates[0].forEach((x, j) => {
      const expected = x - (r ** j - 1) / (r ** (n - 1) - 1);
      expect(Math.abs(fields.u.values[j] - expected)).toBeLessThan(1e-13);
    });
  });

  it("of the Poisson equation in second order", () => {
    const n = 17;
    const h = 1 / (n - 1);
    const factor = (Math.PI * h) ** 2 / (4 * Math.sin((Math.PI * h) / 2) ** 2);
    expect(factor - 1).toBeCloseTo(0.00321896444, 11);
    const { fields, coordinates } = referenceSolver("house-fd2").solve(shippedProblem("poisson-mixed-2d"), [
      n,
      n,
    ]);
    coordinates[0].forEach((x, i) =>
      coordinates[1].forEach((y, j) => {
        const expected = factor * Math.cos(Math.PI * x) * Math.sin(Math.PI * y);
        expect(Math.abs(fields.u.values[i * n + j] - expected)).toBeLessThan(1e-13);
      }),
    );
  });
});

describe("modified wavenumbers", () => {
  // S. K. Lele, J. Comput. Phys. 103 (1992) 16-42, from the coefficients of equations 2.1 and 2.2.
  it.each([
    ["explicit order 2", centralScheme(2), [0.38268343236509, 0.707106781186548, 1, 0.707106781186548]],
    [
      "explicit order 4",
      centralScheme(4),
      [0.392393446289028, 0.776142374915397, 1.33333333333333, 1.10947570824873],
    ],
    [
      "explicit order 6",
      centralScheme(6),
      [0.392689098608713, 0.784230397819373, 1.46666666666667, 1.38423039781937],
    ],
    ["compact order 4", compactScheme(4), [0.392646237414994, 0.783611624891224, 1.5, 1.64075448203408]],
    [
      "compact order 6",
      compactScheme(6),
      [0.392698383390604, 0.785303715649926, 1.55555555555556, 1.97577990612612],
    ],
  ])("of the first derivative, %s", (_, scheme, expected) => {
    [1 / 8, 1 / 4, 1 / 2, 3 / 4].forEach((part, k) => {
      expect(Math.abs(scheme.first(part * Math.PI) - expected[k])).toBeLessThan(1e-13);
    });
  });

  it.each([
    ["explicit order 2", centralScheme(2), [0.152240934977426, 0.585786437626905, 2, 3.4142135623731, 4]],
    [
      "explicit order 4",
      centralScheme(4),
      [0.154172376834327, 0.614381916835873, 2.33333333333333, 4.38561808316413, 16 / 3],
    ],
    [
      "explicit order 6",
      centralScheme(6),
      [0.154211582769546, 0.616615362688947, 2.42222222222222, 4.8278290817555, 272 / 45],
    ],
    ["compact order 4", compactScheme(4), [0.154197195410779, 0.615849459370146, 2.4, 4.77190564267067, 6]],
    [
      "compact order 6",
      compactScheme(6),
      [0.154212395091804, 0.616804584829412, 2.45454545454545, 5.19735470720599, 48 / 7],
    ],
  ])("of the second derivative, %s", (_, scheme, expected) => {
    [1 / 8, 1 / 4, 1 / 2, 3 / 4, 1].forEach((part, k) => {
      expect(Math.abs(scheme.second(part * Math.PI) - expected[k])).toBeLessThan(2e-13);
    });
  });
});

describe("the time integrator", () => {
  it("keeps its tolerance on an oscillator over ten periods", () => {
    const end = 20 * Math.PI;
    const { u } = integrateInTime(
      (_, [position, velocity], out) => {
        out[0] = velocity;
        out[1] = -position;
      },
      Float64Array.of(1, 0),
      0,
      end,
    );
    expect(Math.abs(u[0] - 1)).toBeLessThan(1e-10);
    expect(Math.abs(u[1])).toBeLessThan(1e-10);
  });

  it("uses the time in a right-hand side that depends on it", () => {
    const { u } = integrateInTime((t, _, out) => (out[0] = 3 * t * t), Float64Array.of(1), 1, 2);
    expect(Math.abs(u[0] - 8)).toBeLessThan(1e-13);
  });

  it("leaves the start as it is and refuses an end before it", () => {
    const start = Float64Array.of(1);
    integrateInTime((_, u, out) => (out[0] = -u[0]), start, 0, 1);
    expect(start[0]).toBe(1);
    expect(() => integrateInTime(() => undefined, start, 1, 1)).toThrow(RangeError);
  });
});
