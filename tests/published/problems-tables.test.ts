import { describe, expect, it } from "vitest";

import { normsOf, sumErrors } from "@/benchmarks/norms/error-norms";
import { shippedProblem } from "@/benchmarks/problems/catalogue";
import { evaluateExact } from "@/benchmarks/problems/exact-solution";
import { weightsOf } from "@/benchmarks/quadrature/quadrature-weights";
import { referenceSolver } from "@/benchmarks/solvers/reference-solvers";

/**
 * Errors of independent implementations of the named schemes, from the project's reference catalogue of test problems
 * (computed with NumPy and SciPy; domain-integral norms). N counts intervals: bounded axes have N + 1 nodes.
 */
interface Row {
  intervals: number;
  l1: number;
  l2: number;
  max: number;
  relL2: number;
}

const row = (intervals: number, l1: number, l2: number, max: number, relL2: number): Row => ({
  intervals,
  l1,
  l2,
  max,
  relL2,
});

const tables: { problem: string; solver: string; rows: Row[] }[] = [
  {
    problem: "advection-exp-sine",
    solver: "house-fd2",
    rows: [
      row(16, 0.64488, 0.3478091, 0.2986079, 0.0919),
      row(32, 0.16591, 0.09274258, 0.08065508, 0.02451),
      row(64, 0.041904, 0.02342068, 0.0198776, 0.006188),
      row(128, 0.010472, 0.005866339, 0.004915403, 0.00155),
    ],
  },
  {
    problem: "advection-exp-sine",
    solver: "house-fd4",
    rows: [
      row(16, 0.10214, 0.05354121, 0.0504155, 0.01415),
      row(32, 0.0066321, 0.003820456, 0.003554226, 0.001009),
      row(64, 0.00042616, 0.0002458211, 0.0002272815, 6.495e-5),
      row(128, 2.6747e-5, 1.547603e-5, 1.435694e-5, 4.089e-6),
    ],
  },
  {
    problem: "advection-exp-sine",
    solver: "house-fourier",
    rows: [
      row(8, 0.0053707, 0.00238005, 0.001415099, 0.0006289),
      row(24, 7.3653e-12, 2.941683e-12, 1.251887e-12, 7.773e-13),
    ],
  },
  {
    problem: "advection-diffusion-gaussian",
    solver: "house-fd2",
    rows: [
      row(32, 0.023371, 0.03450854, 0.08833217, 0.1618),
      row(64, 0.0058293, 0.008976488, 0.02259327, 0.0421),
      row(128, 0.0014575, 0.002248344, 0.005504146, 0.01054),
      row(256, 0.0003642, 0.0005620166, 0.001366921, 0.002636),
    ],
  },
  {
    problem: "advection-diffusion-gaussian",
    solver: "house-fd4",
    rows: [
      row(32, 0.0017676, 0.002747496, 0.007131161, 0.01289),
      row(64, 0.00011546, 0.0001803522, 0.0004632278, 0.0008459),
      row(128, 7.2934e-6, 1.141113e-5, 2.920945e-5, 5.352e-5),
      row(256, 4.5732e-7, 7.154316e-7, 1.831669e-6, 3.355e-6),
    ],
  },
  {
    problem: "advection-diffusion-gaussian",
    solver: "house-fourier",
    rows: [
      row(8, 0.022831, 0.0325904, 0.07480209, 0.1532),
      row(24, 1.2548e-10, 2.417312e-10, 7.738098e-10, 1.134e-9),
      row(48, 7.3806e-17, 1.147507e-16, 3.885781e-16, 5.382e-16),
    ],
  },
  {
    problem: "burgers-periodic",
    solver: "house-fd2",
    rows: [
      row(32, 0.0011137, 0.0007024395, 0.0006468568, 0.00209),
      row(64, 0.00029031, 0.0001756201, 0.0001637611, 0.0005226),
      row(128, 7.2994e-5, 4.389589e-5, 4.14182e-5, 0.0001306),
      row(256, 1.8247e-5, 1.097327e-5, 1.03518e-5, 3.265e-5),
    ],
  },
  {
    problem: "burgers-periodic",
    solver: "house-fd4",
    rows: [
      row(32, 0.00026767, 0.0002138906, 0.0002890626, 0.0006364),
      row(64, 1.9471e-5, 1.540241e-5, 2.13333e-5, 4.583e-5),
      row(128, 1.2646e-6, 1.003197e-6, 1.398937e-6, 2.985e-6),
      row(256, 8.0074e-8, 6.338098e-8, 8.853851e-8, 1.886e-7),
    ],
  },
  {
    problem: "burgers-periodic",
    solver: "house-fourier",
    rows: [
      row(16, 0.0022134, 0.001025362, 0.0006215685, 0.003051),
      row(48, 2.3123e-9, 1.059576e-9, 6.551504e-10, 3.153e-9),
    ],
  },
  {
    problem: "helmholtz-periodic-2d",
    solver: "house-fd2",
    rows: [
      row(16, 0.50128, 0.1326355, 0.1167805, 0.00926),
      row(32, 0.1248, 0.03266937, 0.02857538, 0.002281),
      row(64, 0.031103, 0.008137569, 0.007106607, 0.0005681),
      row(128, 0.0077693, 0.002032544, 0.001774347, 0.0001419),
    ],
  },
  {
    problem: "helmholtz-periodic-2d",
    solver: "house-fd4",
    rows: [
      row(16, 0.040179, 0.01106774, 0.01057744, 0.0007727),
      row(32, 0.0026972, 0.0007340934, 0.0007072008, 5.125e-5),
      row(64, 0.00017175, 4.668028e-5, 4.512118e-5, 3.259e-6),
      row(128, 1.0782e-5, 2.930679e-6, 2.835505e-6, 2.046e-7),
    ],
  },
  {
    problem: "helmholtz-periodic-2d",
    solver: "house-fourier",
    rows: [
      row(8, 0.041349, 0.008461118, 0.006109966, 0.0005907),
      row(24, 7.0241e-13, 1.491584e-13, 9.148238e-14, 1.041e-14),
    ],
  },
  {
    problem: "nonlinear-diffusivity",
    solver: "house-fd2",
    rows: [
      row(32, 0.0045519, 0.002425612, 0.002376726, 0.002113),
      row(64, 0.001137, 0.0006028705, 0.0005959049, 0.0005253),
      row(128, 0.00028402, 0.0001504993, 0.0001488836, 0.0001311),
    ],
  },
  {
    problem: "nonlinear-diffusivity",
    solver: "house-fd4",
    rows: [
      row(32, 0.00065274, 0.000376078, 0.0004143062, 0.0003277),
      row(64, 4.1586e-5, 2.400856e-5, 2.652011e-5, 2.092e-5),
      row(128, 2.6131e-6, 1.510659e-6, 1.682745e-6, 1.316e-6),
    ],
  },
  {
    problem: "nonlinear-diffusivity",
    solver: "house-fourier",
    rows: [
      row(24, 3.6358e-8, 1.46931e-8, 7.128984e-9, 1.28e-8),
      row(48, 1.7604e-13, 8.885532e-14, 6.816769e-14, 7.742e-14),
    ],
  },
  {
    problem: "heat-dirichlet",
    solver: "house-fd2",
    rows: [
      row(16, 0.00075017, 0.0008359139, 0.001182161, 0.003172),
      row(64, 4.7014e-5, 5.222999e-5, 7.386437e-5, 0.0001982),
      row(128, 1.1755e-5, 1.305731e-5, 1.846583e-5, 4.955e-5),
    ],
  },
  {
    problem: "heat-dirichlet",
    solver: "house-cheb",
    rows: [
      row(8, 1.9625e-8, 2.303329e-8, 4.113755e-8, 8.74e-8),
      row(12, 1.7725e-13, 2.069039e-13, 3.638756e-13, 7.851e-13),
    ],
  },
  {
    problem: "heat-neumann-robin",
    solver: "house-fd2",
    rows: [
      row(16, 0.00036055, 0.000412953, 0.0007286996, 0.0004965),
      row(64, 2.2538e-5, 2.580386e-5, 4.550616e-5, 3.102e-5),
      row(128, 5.6348e-6, 6.450894e-6, 1.137607e-5, 7.755e-6),
    ],
  },
  {
    problem: "heat-neumann-robin",
    solver: "house-cheb",
    rows: [
      row(8, 1.6159e-6, 1.906772e-6, 3.876127e-6, 2.292e-6),
      row(12, 7.6508e-11, 8.948136e-11, 1.788376e-10, 1.076e-10),
    ],
  },
  {
    problem: "boundary-layer",
    solver: "house-fd2",
    rows: [
      row(16, 0.0063469, 0.01597021, 0.05573556, 0.03117),
      row(64, 0.00040624, 0.0009174527, 0.003020548, 0.001788),
      row(128, 0.00010168, 0.0002279476, 0.0007489586, 0.0004442),
    ],
  },
  {
    problem: "boundary-layer",
    solver: "house-cheb",
    rows: [
      row(12, 0.00011415, 0.0001237503, 0.0001862949, 0.0002412),
      row(16, 6.5346e-7, 7.093052e-7, 1.053105e-6, 1.382e-6),
      row(32, 7.9035e-16, 1.095213e-15, 2.664535e-15, 2.134e-15),
    ],
  },
  {
    problem: "poisson-mixed-2d",
    solver: "house-fd2",
    rows: [
      row(8, 0.0051144, 0.006475373, 0.01295075, 0.01295),
      row(32, 0.00032515, 0.0004017888, 0.0008035777, 0.0008036),
      row(64, 8.1357e-5, 0.0001004109, 0.0002008218, 0.0002008),
    ],
  },
  {
    problem: "poisson-mixed-2d",
    solver: "house-cheb",
    rows: [
      row(8, 1.5824e-6, 2.159588e-6, 6.300903e-6, 4.319e-6),
      row(12, 5.2664e-11, 7.105988e-11, 2.028728e-10, 1.421e-10),
    ],
  },
];

/** Below this the rows sit on round-off or on the time integrator's tolerance and are upper bounds only. */
const floor = 1e-11;

function errorsOf(problemSlug: string, solverSlug: string, intervals: number) {
  const problem = shippedProblem(problemSlug);
  const solver = referenceSolver(solverSlug);
  const kinds = solver.gridKinds(problemSlug);
  const n = problem.axes.map((axis) => (axis.kind === "bounded" ? intervals + 1 : intervals));
  const run = solver.solve(problem, n);
  const exact = evaluateExact(problem, "u", problem.outputTimes.at(-1) ?? null, run.coordinates);
  const weights = problem.axes.map(({ a, b }, axis) => weightsOf(kinds[axis], run.coordinates[axis], a, b));
  return normsOf([sumErrors(run.fields.u, exact, weights)]);
}

describe.each(tables)("$solver on $problem reproduces the published errors", ({ problem, solver, rows }) => {
  it.each(rows)("on $intervals intervals", ({ intervals, l1, l2, max, relL2 }) => {
    const errors = errorsOf(problem, solver, intervals);
    if (relL2 < floor) {
      expect(errors.relL2).toBeLessThan(Math.max(10 * relL2, 1e-12));
      return;
    }
    // The tables carry 7, 5 and 4 digits; their own time integration moves the fifth.
    expect(Math.abs(errors.l2 / l2 - 1)).toBeLessThan(5e-4);
    expect(Math.abs(errors.l1 / l1 - 1)).toBeLessThan(5e-3);
    expect(Math.abs(errors.max / max - 1)).toBeLessThan(5e-3);
    expect(Math.abs((errors.relL2 ?? NaN) / relL2 - 1)).toBeLessThan(5e-3);
  });
});
