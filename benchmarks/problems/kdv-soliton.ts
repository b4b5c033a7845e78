import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-05: Korteweg-de Vries equation with one soliton. */
export const kdvSoliton: ProblemDefinition = {
  slug: "kdv-soliton",
  code: "P-05",
  title: "Korteweg-de Vries equation, one soliton",
  statement:
    "A solitary wave keeps its shape because nonlinear steepening and dispersion balance. A scheme that gets the third derivative or the quadratic term slightly wrong changes the speed of the wave, and the error grows with the distance that it has run. The interval is long enough for the tails to vanish to double precision.",
  keywords: ["Korteweg-de Vries", "soliton", "dispersion", "nonlinear advection"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: false,
    smoothness: { kind: "analytic", stripHalfWidth: Math.PI / 2 },
  },
  axes: [{ name: "x", a: -20, b: 20, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [{ name: "V", value: 4, unit: "dimensionless", meaning: "speed of the wave" }],
  expressions: [{ name: "z", expression: "mod(x - V*t + 25, 40) - 20", meaning: "distance from the crest" }],
  equations: [{ field: "u", identity: "u_t + 6*u*u_x + u_xxx = 0" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "2*sech(x + 5)^2" }],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [2.5],
  exact: { kind: "expression", fields: { u: "V/2*sech(sqrt(V)/2*z)^2" } },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [64, 80, 96, 112, 128, 144, 160, 176, 192, 224, 256, 512, 1024],
      "cell-centred": [128, 256, 512],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 5, t: 2.5 }, value: 2 },
    { field: "u", at: { x: 4, t: 2.5 }, value: 0.8399486832280522 },
    { field: "u", at: { x: 7, t: 2.5 }, value: 0.14130164970632894 },
  ],
  notes: ["The solution on the line is made periodic; at the far end of the interval it is below 4e-17."],
  sources: [
    {
      citation:
        "D. J. Korteweg and G. de Vries, On the change of form of long waves, Phil. Mag. 39 (1895) 422-443",
      isFromMemory: true,
    },
    {
      citation:
        "N. J. Zabusky and M. D. Kruskal, Interaction of solitons in a collisionless plasma, Phys. Rev. Lett. 15 (1965) 240-243",
      isFromMemory: true,
    },
    {
      citation:
        "B. Fornberg and G. B. Whitham, A numerical and theoretical study of certain nonlinear wave phenomena, Phil. Trans. R. Soc. A 289 (1978) 373-404",
      isFromMemory: true,
    },
  ],
};
