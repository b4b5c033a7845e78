import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-12: linear advection of a square wave. */
export const advectionSquareWave: ProblemDefinition = {
  slug: "advection-square-wave",
  code: "P-12",
  title: "Advection of a square wave",
  statement:
    "A square wave is carried at constant speed round a periodic interval. It jumps, so no scheme keeps its formal order: the rates in the integral norms follow from the order by known laws, the maximum norm does not fall at all, and central and spectral schemes overshoot. The solution is a weak one.",
  keywords: ["advection", "discontinuity", "Gibbs phenomenon", "limited smoothness"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "discontinuous" },
  },
  axes: [{ name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [{ name: "c", value: 1, unit: "dimensionless", meaning: "speed of the wave" }],
  expressions: [
    {
      name: "z",
      expression: "abs(mod(x - c*t, 2*pi) - pi)",
      meaning: "distance from the middle of the wave",
    },
  ],
  equations: [{ field: "u", identity: "u_t + c*u_x = 0" }],
  initialTime: 0,
  initialConditions: [
    { field: "u", timeDerivative: 0, expression: "abs(x - pi) < pi/2 ? 1 : (abs(x - pi) == pi/2 ? 1/2 : 0)" },
  ],
  boundaryConditions: [],
  kinks: ["pi/2 + c*t", "3*pi/2 + c*t"],
  outputTimes: [1],
  exact: { kind: "expression", fields: { u: "z < pi/2 ? 1 : (z == pi/2 ? 1/2 : 0)" } },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [64, 96, 128, 192, 256, 384, 512, 1024],
      "cell-centred": [64, 128, 256, 512],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 2, t: 1 }, value: 0 },
    { field: "u", at: { x: Math.PI + 1, t: 1 }, value: 1 },
    { field: "u", at: { x: 4, t: 1 }, value: 1 },
  ],
  notes: [
    "At the final time the jumps lie between nodes; after a whole turn a Fourier result would be exact at the nodes and mean nothing.",
    "Laws of the L2 rate: p/(2(p + 1)) for central differences of order p, 1/2 for Fourier.",
  ],
  sources: [
    {
      citation: "R. J. LeVeque, Finite Volume Methods for Hyperbolic Problems, Cambridge, 2002",
      isFromMemory: true,
    },
    {
      citation:
        "P. Brenner, V. Thomee and L. B. Wahlbin, Besov Spaces and Applications to Difference Methods for Initial Value Problems, Springer, 1975",
      isFromMemory: true,
    },
    {
      citation:
        "D. Gottlieb and C.-W. Shu, On the Gibbs phenomenon and its resolution, SIAM Rev. 39 (1997) 644-668",
      isFromMemory: true,
    },
  ],
};
