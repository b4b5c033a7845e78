import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-07: sine-Gordon equation with a breather at rest. */
export const sineGordonBreather: ProblemDefinition = {
  slug: "sine-gordon-breather",
  code: "P-07",
  title: "Sine-Gordon equation, breather",
  statement:
    "A breather is a bound state of a kink and an antikink that oscillates in place. The equation is of second order in time, nonlinear and without damping; the amplitude exceeds pi, so the sine is felt in full. Amplitude and period of the oscillation are what a scheme has to keep.",
  keywords: ["sine-Gordon", "breather", "second order in time", "nonlinear wave"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: false,
    smoothness: { kind: "analytic", stripHalfWidth: Math.PI / Math.sqrt(3) },
  },
  axes: [{ name: "x", a: -45, b: 45, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    { name: "omega", value: 0.5, unit: "dimensionless", meaning: "frequency of the oscillation" },
    {
      name: "kappa",
      value: 0.86602540378443865,
      unit: "dimensionless",
      meaning: "inverse width, sqrt(1 - omega^2)",
    },
  ],
  expressions: [],
  equations: [{ field: "u", identity: "u_tt - u_xx + sin(u) = 0" }],
  initialTime: 0,
  initialConditions: [
    { field: "u", timeDerivative: 0, expression: "0" },
    { field: "u", timeDerivative: 1, expression: "4*kappa*sech(kappa*x)" },
  ],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [10],
  exact: { kind: "expression", fields: { u: "4*atan(kappa/omega*sin(omega*t)/cosh(kappa*x))" } },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [128, 160, 192, 224, 256, 288, 320, 352, 384, 512, 1024],
      "cell-centred": [256, 512, 1024],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, t: 10 }, value: -4.115391776524266 },
    { field: "u", at: { x: 1, t: 10 }, value: -3.483086842167026 },
    { field: "u", at: { x: 3, t: 10 }, value: -0.9642249988533209 },
  ],
  notes: ["Only u is scored, not u_t."],
  sources: [
    {
      citation:
        "M. J. Ablowitz, D. J. Kaup, A. C. Newell and H. Segur, Method for solving the sine-Gordon equation, Phys. Rev. Lett. 30 (1973) 1262-1264",
      isFromMemory: true,
    },
    {
      citation: "P. G. Drazin and R. S. Johnson, Solitons: an Introduction, Cambridge, 1989",
      isFromMemory: true,
    },
  ],
};
