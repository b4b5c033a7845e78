import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** wave equation with a plucked string. */
export const pluckedString: ProblemDefinition = {
  slug: "plucked-string",
  code: "R-01",
  title: "Plucked string",
  statement:
    "A string is plucked at three tenths of its length and let go. The corner splits into two that run apart and carry flat pieces between them. The slope jumps, so the order of any scheme is limited by the data; the problem shows how dispersion leaves ripples behind a corner.",
  keywords: ["wave equation", "kink", "Dirichlet", "limited smoothness"],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "finite", continuousDerivatives: 0 },
  },
  axes: [{ name: "x", a: 0, b: 1, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [{ name: "p", value: 0.3, unit: "dimensionless", meaning: "place of the pluck" }],
  expressions: [
    { name: "y1", expression: "mod(x - t + 1, 2) - 1", meaning: "x - t on the odd extension" },
    { name: "y2", expression: "mod(x + t + 1, 2) - 1", meaning: "x + t on the odd extension" },
    {
      name: "g1",
      expression: "sign(y1)*min(abs(y1)/p, (1 - abs(y1))/(1 - p))",
      meaning: "the wave that runs up",
    },
    {
      name: "g2",
      expression: "sign(y2)*min(abs(y2)/p, (1 - abs(y2))/(1 - p))",
      meaning: "the wave that runs down",
    },
  ],
  equations: [{ field: "u", identity: "u_tt = u_xx" }],
  initialTime: 0,
  initialConditions: [
    { field: "u", timeDerivative: 0, expression: "x < p ? x/p : (1 - x)/(1 - p)" },
    { field: "u", timeDerivative: 1, expression: "0" },
  ],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
    { field: "u", axis: "x", end: "b", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
  ],
  kinks: ["p - t", "p + t"],
  outputTimes: [0.3],
  exact: { kind: "expression", fields: { u: "(g1 + g2)/2" } },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [33, 65, 129, 257, 513],
      "cell-centred": [32, 64, 128, 256],
      "chebyshev-lobatto": [17, 25, 33, 49, 65],
      "legendre-lobatto": [17, 25, 33, 49, 65],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0.1, t: 0.3 }, value: 0.09523809523809523 },
    { field: "u", at: { x: 0.45, t: 0.3 }, value: 0.42857142857142855 },
    { field: "u", at: { x: 0.8, t: 0.3 }, value: 0.2857142857142857 },
  ],
  notes: ["At the final time the lower corner has just reached the end."],
  sources: [
    {
      citation:
        "J. le R. d'Alembert, Recherches sur la courbe que forme une corde tendue mise en vibration, 1747",
      isFromMemory: true,
    },
  ],
};
