import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-12: heat equation whose initial values disagree with the boundary values. */
export const heatIncompatibleData: ProblemDefinition = {
  slug: "heat-incompatible-data",
  code: "B-12",
  title: "Heat equation with data that disagree at the corners",
  statement:
    "A rod of unit temperature is put between two ends held at zero. The initial values jump at the corners, and the jump is smoothed at once, so at a fixed later time every space discretisation may reach its full order. What fails is time stepping: the trapezoidal rule with steps in proportion to the spacing does not converge in the maximum norm.",
  keywords: ["heat equation", "incompatible data", "corner singularity", "Dirichlet", "time stepping"],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [{ name: "x", a: 0, b: 1, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [],
  expressions: [],
  equations: [{ field: "u", identity: "u_t = u_xx" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "1", isLimit: true }],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
    { field: "u", axis: "x", end: "b", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
  ],
  kinks: [],
  outputTimes: [0.02],
  exact: {
    kind: "expression",
    fields: {
      u: "1 - erfc(x/(2*sqrt(t))) - erfc((1 - x)/(2*sqrt(t))) + erfc((1 + x)/(2*sqrt(t))) + erfc((2 - x)/(2*sqrt(t))) - erfc((2 + x)/(2*sqrt(t))) - erfc((3 - x)/(2*sqrt(t)))",
    },
  },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [9, 17, 33, 65, 129, 257],
      "cell-centred": [16, 32, 64, 128, 256],
      "chebyshev-lobatto": [9, 11, 13, 15, 17, 19, 21, 23, 25, 27, 29, 33],
      "legendre-lobatto": [9, 11, 13, 15, 17, 19, 21, 23, 25, 27, 29, 33],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0.05, t: 0.02 }, value: 0.19741076929857265 },
    { field: "u", at: { x: 0.1, t: 0.02 }, value: 0.38291816518090166 },
    { field: "u", at: { x: 0.25, t: 0.02 }, value: 0.7885236185063406 },
    { field: "u", at: { x: 0.5, t: 0.02 }, value: 0.975161338697023 },
    { field: "u", at: { x: 0.77, t: 0.02 }, value: 0.7497380116756911 },
  ],
  notes: [
    "The initial values hold between the ends, as t falls to 0; the ends are at zero from the start.",
    "Of the images the six nearest are written out; the others are below 1e-95 at the final time.",
  ],
  sources: [
    {
      citation: "H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford, 1959",
      isFromMemory: true,
    },
    {
      citation:
        "R. Rannacher, Finite element solution of diffusion problems with irregular data, Numer. Math. 43 (1984) 309-327",
      isFromMemory: true,
    },
  ],
};
