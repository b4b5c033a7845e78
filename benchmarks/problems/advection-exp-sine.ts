import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-01: linear advection of exp(sin x). */
export const advectionExpSine: ProblemDefinition = {
  slug: "advection-exp-sine",
  code: "P-01",
  title: "Linear advection of exp(sin x)",
  statement:
    "A smooth wave is carried at constant speed round a periodic interval. Nothing damps it, so whatever the discretisation does to phase and amplitude stays in the result: the problem isolates dispersion and dissipation of the first-derivative operator. The solution is entire, its Fourier coefficients fall faster than geometrically, and a spectral method reaches round-off with two dozen nodes.",
  keywords: ["advection", "phase error", "dispersion", "dissipation", "travelling wave"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [{ name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [{ name: "c", value: 1, unit: "dimensionless", meaning: "speed of the wave" }],
  expressions: [],
  equations: [{ field: "u", identity: "u_t + c*u_x = 0" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "exp(sin(x))" }],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [3],
  exact: { kind: "expression", fields: { u: "exp(sin(x - c*t))" } },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [8, 10, 12, 14, 16, 18, 20, 22, 24, 28, 32, 48, 64, 96, 128, 192, 256],
      "cell-centred": [16, 24, 32, 48, 64, 96, 128, 192, 256],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, t: 3 }, value: 0.86838509223406853 },
    { field: "u", at: { x: 1, t: 3 }, value: 0.40280712612352804 },
    { field: "u", at: { x: 4, t: 3 }, value: 2.3197768247158532 },
  ],
  notes: [
    "The final time is 3 and not one full period: after a full period a Fourier scheme with constant coefficients returns its nodal data exactly, and the error at the nodes says nothing.",
    "The error of a difference scheme grows linearly in time, since it is a phase error.",
  ],
  sources: [
    {
      citation: "L. N. Trefethen, Spectral Methods in MATLAB, SIAM, 2000 (the function, in programs 4 and 5)",
      doi: "10.1137/1.9780898719598",
      isFromMemory: true,
    },
  ],
};
