import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-07: bistable (Nagumo) equation with a travelling front. */
export const bistableFront: ProblemDefinition = {
  slug: "bistable-front",
  code: "B-07",
  title: "Bistable reaction-diffusion front",
  statement:
    "Two stable states meet in a front that moves because one of them is favoured. Both ends carry a derivative condition whose data follow the front in time. The reaction term is cubic; with the parameter at one half the front would stand still as the Allen-Cahn kink.",
  keywords: ["Nagumo", "Allen-Cahn", "reaction-diffusion", "Neumann", "travelling front"],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: false,
    isLinear: false,
    smoothness: { kind: "analytic", stripHalfWidth: Math.PI * Math.SQRT2 },
  },
  axes: [{ name: "x", a: -10, b: 10, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    { name: "alpha", value: 0.25, unit: "dimensionless", meaning: "unstable state between 0 and 1" },
  ],
  expressions: [
    {
      name: "left",
      expression: "1/(1 + exp((-10 - (1 - 2*alpha)*t/sqrt(2))/sqrt(2)))",
      meaning: "the front at the lower end",
    },
    {
      name: "right",
      expression: "1/(1 + exp((10 - (1 - 2*alpha)*t/sqrt(2))/sqrt(2)))",
      meaning: "the front at the upper end",
    },
  ],
  equations: [{ field: "u", identity: "u_t = u_xx + u*(1 - u)*(u - alpha)" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "1/(1 + exp(x/sqrt(2)))" }],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "neumann", alpha: "0", beta: "1", g: "left*(1 - left)/sqrt(2)" },
    {
      field: "u",
      axis: "x",
      end: "b",
      kind: "neumann",
      alpha: "0",
      beta: "1",
      g: "-right*(1 - right)/sqrt(2)",
    },
  ],
  kinks: [],
  outputTimes: [4],
  exact: { kind: "expression", fields: { u: "1/(1 + exp((x - (1 - 2*alpha)*t/sqrt(2))/sqrt(2)))" } },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [21, 41, 81, 161, 321],
      "cell-centred": [40, 80, 160, 320],
      "chebyshev-lobatto": [13, 17, 21, 25, 29, 33, 37, 41, 45, 49, 57],
      "legendre-lobatto": [13, 17, 21, 25, 29, 33, 37, 41, 45, 49, 57],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, t: 4 }, value: 0.7310585786300049 },
    { field: "u", at: { x: 2, t: 4 }, value: 0.39790221958954514 },
    { field: "u", at: { x: -3, t: 4 }, value: 0.9577636715452266 },
  ],
  notes: [
    "The data of a derivative condition are those of the outward derivative: at the lower end minus u_x.",
  ],
  sources: [
    { citation: "H. P. McKean, Nagumo's equation, Adv. Math. 4 (1970) 209-223", isFromMemory: true },
    {
      citation:
        "K. P. Hadeler and F. Rothe, Travelling fronts in nonlinear diffusion equations, J. Math. Biol. 2 (1975) 251-263",
      isFromMemory: true,
    },
    { citation: "J. D. Murray, Mathematical Biology, Springer, 1989", isFromMemory: true },
  ],
};
