import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-09: porous medium equation with exponent 2, a spreading Barenblatt profile. */
export const porousMedium2: ProblemDefinition = {
  slug: "porous-medium-2",
  code: "B-09",
  title: "Porous medium equation, exponent 2",
  statement:
    "Diffusion that vanishes with the solution: gas in a porous medium spreads with a sharp front that moves at finite speed. At the front the solution has a corner. The mass is kept. The front crosses cells as it moves, so errors fall irregularly, and the initial time is not zero.",
  keywords: ["porous medium", "degenerate diffusion", "free boundary", "limited smoothness"],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: false,
    isLinear: false,
    smoothness: { kind: "finite", continuousDerivatives: 0 },
  },
  axes: [{ name: "x", a: -6, b: 6, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    {
      name: "k",
      value: 0.3333333333333333,
      unit: "dimensionless",
      meaning: "exponent of the front, 1/(m + 1)",
    },
  ],
  expressions: [
    {
      name: "q",
      expression: "1 - k*1/4*x^2*t^(-2*k)",
      meaning: "one less the square of the distance over the front's",
    },
  ],
  equations: [{ field: "u", identity: "u_t = d(d(u^2, x), x)" }],
  initialTime: 1,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "max(0, 1 - k/4*x^2)" }],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
    { field: "u", axis: "x", end: "b", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
  ],
  kinks: ["sqrt(12)*t^(1/3)", "-sqrt(12)*t^(1/3)"],
  outputTimes: [2],
  exact: { kind: "expression", fields: { u: "q > 0 ? t^(-k)*q : 0" } },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [61, 121, 241, 481],
      "cell-centred": [60, 120, 240, 480],
      "chebyshev-lobatto": [33, 49, 65, 97],
      "legendre-lobatto": [33, 49, 65, 97],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, t: 2 }, value: 0.7937005259840998 },
    { field: "u", at: { x: 2, t: 2 }, value: 0.627033859317433 },
    { field: "u", at: { x: 4, t: 2 }, value: 0.12703385931743308 },
  ],
  notes: ["The initial time is 1.", "The support stays clear of both ends."],
  sources: [
    {
      citation:
        "G. I. Barenblatt, On some unsteady motions of a liquid and gas in a porous medium, Prikl. Mat. Mekh. 16 (1952) 67-78",
      isFromMemory: true,
    },
    {
      citation:
        "R. E. Pattle, Diffusion from an instantaneous point source with a concentration-dependent coefficient, Quart. J. Mech. Appl. Math. 12 (1959) 407-409",
      isFromMemory: true,
    },
    { citation: "J. L. Vazquez, The Porous Medium Equation, Oxford, 2007", isFromMemory: true },
  ],
};
