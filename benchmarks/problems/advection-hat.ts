import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-13: linear advection of a hat function. */
export const advectionHat: ProblemDefinition = {
  slug: "advection-hat",
  code: "P-13",
  title: "Advection of a hat",
  statement:
    "A hat with three corners is carried at constant speed round a periodic interval. The solution is continuous and its slope jumps, so schemes converge at rates between those of a square wave and of a smooth one, and the peak is cut off. A spectral method gains only a constant factor.",
  keywords: ["advection", "kink", "limited smoothness"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "finite", continuousDerivatives: 0 },
  },
  axes: [{ name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [{ name: "c", value: 1, unit: "dimensionless", meaning: "speed of the wave" }],
  expressions: [{ name: "z", expression: "abs(mod(x - c*t, 2*pi) - pi)", meaning: "distance from the peak" }],
  equations: [{ field: "u", identity: "u_t + c*u_x = 0" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "max(0, 1 - abs(x - pi)/(pi/2))" }],
  boundaryConditions: [],
  kinks: ["pi/2 + c*t", "pi + c*t", "3*pi/2 + c*t"],
  outputTimes: [1],
  exact: { kind: "expression", fields: { u: "max(0, 1 - 2*z/pi)" } },
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
    { field: "u", at: { x: 4, t: 1 }, value: 0.909859317102744 },
    { field: "u", at: { x: 2, t: 1 }, value: 0 },
    { field: "u", at: { x: 1 + Math.PI, t: 1 }, value: 1 },
  ],
  notes: ["Laws of the L2 rate: 3 p/(2(p + 1)) for central differences of order p, 3/2 for Fourier."],
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
  ],
};
