import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-06: focusing cubic Schroedinger equation with a moving bright soliton. */
export const schrodingerBrightSoliton: ProblemDefinition = {
  slug: "schrodinger-bright-soliton",
  code: "P-06",
  title: "Cubic Schroedinger equation, bright soliton",
  statement:
    "The focusing cubic Schroedinger equation carries a localised wave packet that neither spreads nor collapses. The solution is complex; its phase turns while its envelope moves, and for difference schemes the phase error dominates. The interval is long enough for the envelope to vanish to double precision at its ends.",
  keywords: ["Schroedinger", "soliton", "complex", "dispersion", "phase error"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: false,
    smoothness: { kind: "analytic", stripHalfWidth: Math.PI / 4 },
  },
  axes: [{ name: "x", a: -20, b: 20, kind: "periodic" }],
  fields: [{ name: "u", values: "complex", isScored: true }],
  parameters: [
    { name: "a", value: 2, unit: "dimensionless", meaning: "amplitude of the envelope" },
    { name: "v", value: 1, unit: "dimensionless", meaning: "speed of the envelope" },
  ],
  expressions: [],
  equations: [{ field: "u", identity: "i*u_t + u_xx + 2*abs(u)^2*u = 0" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "a*sech(a*x)*exp(i*v*x/2)" }],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [1],
  exact: { kind: "expression", fields: { u: "a*sech(a*(x - v*t))*exp(i*(v*x/2 + (a^2 - v^2/4)*t))" } },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [96, 128, 160, 192, 224, 256, 288, 320, 384, 512, 1024],
      "cell-centred": [256, 512, 1024],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 1, t: 1 }, value: -0.8921749798275856, imaginary: -1.789978716457167 },
    { field: "u", at: { x: 0, t: 1 }, value: -0.4362130121430306, imaginary: -0.30384454487412166 },
    { field: "u", at: { x: 1.5, t: 1 }, value: -0.27321423738302403, imaginary: -1.2669851407760537 },
  ],
  notes: ["Errors are moduli of the complex difference."],
  sources: [
    {
      citation:
        "V. E. Zakharov and A. B. Shabat, Exact theory of two-dimensional self-focusing, Sov. Phys. JETP 34 (1972) 62-69",
      isFromMemory: true,
    },
    {
      citation:
        "T. R. Taha and M. J. Ablowitz, Analytical and numerical aspects of certain nonlinear evolution equations II, J. Comput. Phys. 55 (1984) 203-230",
      isFromMemory: true,
    },
  ],
};
