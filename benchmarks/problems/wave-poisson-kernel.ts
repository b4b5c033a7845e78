import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-08: wave equation started from rest with a Poisson kernel. */
export const wavePoissonKernel: ProblemDefinition = {
  slug: "wave-poisson-kernel",
  code: "P-08",
  title: "Wave equation with a Poisson kernel",
  statement:
    "A smooth hump splits into two that run apart round a periodic interval. The equation is linear and of second order in time. The Fourier coefficients of the hump fall at exactly a geometric rate, so the rate at which a spectral method converges can be compared with theory.",
  keywords: ["wave equation", "second order in time", "Poisson kernel", "geometric convergence"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "analytic", stripHalfWidth: Math.acosh(2) },
  },
  axes: [{ name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [],
  expressions: [],
  equations: [{ field: "u", identity: "u_tt = u_xx" }],
  initialTime: 0,
  initialConditions: [
    { field: "u", timeDerivative: 0, expression: "1/(2 - cos(x))" },
    { field: "u", timeDerivative: 1, expression: "0" },
  ],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [2],
  exact: { kind: "expression", fields: { u: "1/(2*(2 - cos(x - t))) + 1/(2*(2 - cos(x + t)))" } },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [8, 10, 12, 14, 16, 18, 20, 24, 28, 32, 36, 40, 48, 64, 128, 256],
      "cell-centred": [32, 64, 128, 256],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, t: 2 }, value: 0.4138821303712965 },
    { field: "u", at: { x: 1, t: 2 }, value: 0.5097611785801591 },
    { field: "u", at: { x: 2, t: 2 }, value: 0.6884201767218757 },
  ],
  notes: ["The Fourier coefficients at the start are (2 - sqrt 3)^|k|/sqrt 3."],
  sources: [
    {
      citation:
        "J. le R. d'Alembert's solution, as in R. J. LeVeque, Finite Difference Methods for Ordinary and Partial Differential Equations, SIAM, 2007",
      doi: "10.1137/1.9780898717839",
      isFromMemory: true,
    },
  ],
};
