import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-10: steady diffusion through two layers. */
export const diffusivityJump: ProblemDefinition = {
  slug: "diffusivity-jump",
  code: "B-10",
  title: "Diffusion across a jump of the diffusivity",
  statement:
    "Steady diffusion with a uniform source through two layers whose diffusivities differ by a factor of ten. The flux is continuous, the slope jumps at the interface, which lies at a third and so on no node of the usual grids. Sampling the diffusivity half-way between nodes loses an order; its harmonic mean over each cell keeps second order; global collocation does not converge well.",
  keywords: ["interface", "discontinuous coefficient", "harmonic mean", "limited smoothness", "steady"],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: true,
    isLinear: true,
    smoothness: { kind: "finite", continuousDerivatives: 0 },
  },
  axes: [{ name: "x", a: 0, b: 1, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    { name: "k1", value: 1, unit: "dimensionless", meaning: "diffusivity of the first layer" },
    { name: "k2", value: 10, unit: "dimensionless", meaning: "diffusivity of the second layer" },
  ],
  expressions: [{ name: "k", expression: "x < 1/3 ? k1 : k2", meaning: "diffusivity" }],
  equations: [{ field: "u", identity: "-d(k*u_x, x) = 1" }],
  initialTime: 0,
  initialConditions: [],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
    { field: "u", axis: "x", end: "b", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
  ],
  kinks: ["1/3"],
  outputTimes: [],
  exact: { kind: "expression", fields: { u: "x <= 1/3 ? x/4 - x^2/2 : ((x - 1)/4 - (x^2 - 1)/2)/10" } },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [17, 33, 65, 129, 257, 513],
      "cell-centred": [16, 32, 64, 128, 256, 512],
      "chebyshev-lobatto": [17, 33, 65, 129],
      "legendre-lobatto": [17, 33, 65, 129],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 1 / 3 }, value: 0.027777777777777776 },
    { field: "u", at: { x: 0.25 }, value: 0.03125 },
    { field: "u", at: { x: 0.75 }, value: 0.015625 },
  ],
  notes: ["Use numbers of intervals that 3 does not divide: otherwise the interface is a node."],
  sources: [
    {
      citation:
        "S. V. Patankar, Numerical Heat Transfer and Fluid Flow, Hemisphere, 1980 (the harmonic mean)",
      isFromMemory: true,
    },
    {
      citation:
        "R. J. LeVeque and Z. Li, The immersed interface method for elliptic equations with discontinuous coefficients and singular sources, SIAM J. Numer. Anal. 31 (1994) 1019-1044",
      isFromMemory: true,
    },
  ],
};
