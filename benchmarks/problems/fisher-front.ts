import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-06: Fisher equation with a travelling front in closed form. */
export const fisherFront: ProblemDefinition = {
  slug: "fisher-front",
  code: "B-06",
  title: "Fisher equation, travelling front",
  statement:
    "A population front of the Fisher equation advances at the one speed for which it is known in closed form. The values at both ends follow the exact solution in time, so time-dependent Dirichlet data enter, and a stepper that takes them at the wrong stage loses order. The front is analytic in a wide strip.",
  keywords: ["Fisher", "reaction-diffusion", "travelling front", "time-dependent boundary data"],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: false,
    isLinear: false,
    smoothness: { kind: "analytic", stripHalfWidth: Math.PI * Math.sqrt(6) },
  },
  axes: [{ name: "x", a: -15, b: 25, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    { name: "V", value: 2.0412414523193151, unit: "dimensionless", meaning: "speed of the front, 5/sqrt 6" },
  ],
  expressions: [
    { name: "left", expression: "(1 + exp((-15 - V*t)/sqrt(6)))^-2", meaning: "the front at the lower end" },
    { name: "right", expression: "(1 + exp((25 - V*t)/sqrt(6)))^-2", meaning: "the front at the upper end" },
  ],
  equations: [{ field: "u", identity: "u_t = u_xx + u*(1 - u)" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "(1 + exp(x/sqrt(6)))^-2" }],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "left" },
    { field: "u", axis: "x", end: "b", kind: "dirichlet", alpha: "1", beta: "0", g: "right" },
  ],
  kinks: [],
  outputTimes: [3],
  exact: { kind: "expression", fields: { u: "(1 + exp((x - 5*t/sqrt(6))/sqrt(6)))^-2" } },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [21, 41, 81, 161, 321],
      "cell-centred": [40, 80, 160, 320],
      "chebyshev-lobatto": [17, 21, 25, 29, 33, 37, 41, 45, 49, 57, 65],
      "legendre-lobatto": [17, 21, 25, 29, 33, 37, 41, 45, 49, 57, 65],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, t: 3 }, value: 0.8540381034336483 },
    { field: "u", at: { x: 5, t: 3 }, value: 0.3754253423575409 },
    { field: "u", at: { x: 10, t: 3 }, value: 0.029051201297802396 },
  ],
  notes: [],
  sources: [
    {
      citation:
        "M. J. Ablowitz and A. Zeppetella, Explicit solutions of Fisher's equation for a special wave speed, Bull. Math. Biol. 41 (1979) 835-840",
      isFromMemory: true,
    },
  ],
};
