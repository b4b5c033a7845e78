import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-03: steady advection and diffusion with a layer at the outflow end. */
export const boundaryLayer: ProblemDefinition = {
  slug: "boundary-layer",
  code: "B-03",
  title: "Steady boundary layer",
  statement:
    "Advection towards an end that is held at zero leaves a layer of width eps in which the solution falls steeply. Central differences need a node spacing below twice that width, or they oscillate; upwind differences do not oscillate and are of first order; nodes that cluster at the end resolve the layer with few unknowns. The problem is steady and linear, and its second-order solution is known in closed form.",
  keywords: [
    "boundary layer",
    "singular perturbation",
    "advection-diffusion",
    "cell Peclet number",
    "steady",
  ],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: true,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [{ name: "x", a: 0, b: 1, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    { name: "eps", value: 0.05, unit: "dimensionless", meaning: "diffusivity, the width of the layer" },
  ],
  expressions: [],
  equations: [{ field: "u", identity: "-eps*u_xx + u_x = 1" }],
  initialTime: 0,
  initialConditions: [],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
    { field: "u", axis: "x", end: "b", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
  ],
  kinks: [],
  outputTimes: [],
  exact: {
    kind: "expression",
    fields: { u: "x - (exp((x - 1)/eps) - exp(-1/eps))/(1 - exp(-1/eps))" },
  },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [17, 33, 65, 129, 257, 513, 1025],
      "cell-centred": [16, 32, 64, 128, 256, 512, 1024],
      "chebyshev-lobatto": [9, 11, 13, 15, 17, 19, 21, 23, 25, 27, 29, 33, 41],
      "chebyshev-gauss": [8, 10, 12, 14, 16, 18, 20, 22, 24, 26, 28, 32, 40],
      "legendre-lobatto": [8, 10, 12, 14, 16, 18, 20, 22, 24, 26, 28, 32, 40],
      "legendre-gauss": [8, 10, 12, 14, 16, 18, 20, 22, 24, 26, 28, 32, 40],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0.5 }, value: 0.49995460213129757 },
    { field: "u", at: { x: 0.9 }, value: 0.76466471854559412 },
    { field: "u", at: { x: 0.95 }, value: 0.58212056013145526 },
  ],
  notes: [
    "Central differences of second order give x - (r^j - 1)/(r^N - 1) at node j of N intervals, with r = (1 + Pe)/(1 - Pe) and the cell Peclet number Pe = h/(2 eps).",
  ],
  sources: [
    {
      citation:
        "R. J. LeVeque, Finite Difference Methods for Ordinary and Partial Differential Equations, SIAM, 2007, section 2.17",
      doi: "10.1137/1.9780898717839",
      isFromMemory: true,
    },
    {
      citation:
        "H.-G. Roos, M. Stynes and L. Tobiska, Robust Numerical Methods for Singularly Perturbed Differential Equations, 2nd ed., Springer, 2008",
      isFromMemory: true,
    },
  ],
};
