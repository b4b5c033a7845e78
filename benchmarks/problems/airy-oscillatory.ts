import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-04: Airy equation with a turning point. */
export const airyOscillatory: ProblemDefinition = {
  slug: "airy-oscillatory",
  code: "B-04",
  title: "Airy equation, from oscillation to decay",
  statement:
    "A linear equation whose solution oscillates on one side of a turning point and decays on the other. For second-order differences the phase error over the oscillations decides the error, so its constant is large; collocation on clustered nodes converges faster than geometrically once every oscillation has a few nodes.",
  keywords: ["Airy function", "turning point", "oscillation", "variable coefficient", "steady"],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: true,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [{ name: "x", a: -1, b: 1, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    {
      name: "lambda",
      value: 8.5,
      unit: "dimensionless",
      meaning: "argument of the Airy function at the upper end",
    },
  ],
  expressions: [],
  equations: [{ field: "u", identity: "u_xx - lambda^3*x*u = 0" }],
  initialTime: 0,
  initialConditions: [],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "-0.33029023763020888" },
    { field: "u", axis: "x", end: "b", kind: "dirichlet", alpha: "1", beta: "0", g: "1.0997009755195507e-8" },
  ],
  kinks: [],
  outputTimes: [],
  exact: { kind: "builtIn", name: "airy" },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [33, 65, 129, 257, 513],
      "cell-centred": [64, 128, 256, 512],
      "chebyshev-lobatto": [17, 21, 25, 27, 29, 31, 33, 35, 37, 39, 41, 43, 45, 49],
      "legendre-lobatto": [17, 21, 25, 27, 29, 31, 33, 35, 37, 39, 41, 43, 45, 49],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: -1 }, value: -0.33029023763020887 },
    { field: "u", at: { x: -0.5 }, value: 0.12778292722826728 },
    { field: "u", at: { x: 0 }, value: 0.3550280538878172 },
    { field: "u", at: { x: 0.5 }, value: 0.0005646398353425014 },
    { field: "u", at: { x: 1 }, value: 1.0997009755195506e-8 },
  ],
  notes: [
    "The values at the ends are Ai(-8.5) and Ai(8.5).",
    "With an argument of 10 instead of 8.5 the problem is nearly resonant, and errors of difference schemes become erratic.",
  ],
  sources: [
    { citation: "NIST Digital Library of Mathematical Functions, chapter 9", isFromMemory: true },
    {
      citation:
        "C. M. Bender and S. A. Orszag, Advanced Mathematical Methods for Scientists and Engineers, McGraw-Hill, 1978",
      isFromMemory: true,
    },
  ],
};
