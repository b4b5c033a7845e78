import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-11: diffusion with a diffusivity that depends on the solution, manufactured travelling profile. */
export const nonlinearDiffusivity: ProblemDefinition = {
  slug: "nonlinear-diffusivity",
  code: "P-11",
  title: "Nonlinear diffusivity, manufactured travelling profile",
  statement:
    "Diffusion whose coefficient grows with the square of the solution, driven by a source chosen so that a decaying profile travels through a periodic interval. The problem checks the discretisation of a flux in divergence form with a variable coefficient, and the treatment of a source that depends on space and time. The solution is entire.",
  keywords: ["nonlinear diffusion", "variable coefficient", "manufactured solution", "source term"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: false,
    smoothness: { kind: "entire" },
  },
  axes: [{ name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [],
  expressions: [
    { name: "k", expression: "1 + u^2", meaning: "diffusivity" },
    { name: "w", expression: "exp(-t/2 + cos(x - t))/2", meaning: "the profile that the source is made for" },
    {
      name: "f",
      expression: "-w/2 + w*sin(x - t) - (2*w^3*sin(x - t)^2 + (1 + w^2)*w*(sin(x - t)^2 - cos(x - t)))",
      meaning: "source",
    },
  ],
  equations: [{ field: "u", identity: "u_t = d(k*u_x, x) + f" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "exp(cos(x))/2" }],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [1],
  exact: { kind: "expression", fields: { u: "exp(-t/2 + cos(x - t))/2" } },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [8, 10, 12, 14, 16, 18, 20, 24, 28, 32, 36, 40, 48, 64, 96, 128, 192, 256],
      "cell-centred": [16, 24, 32, 48, 64, 96, 128, 192, 256],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, t: 1 }, value: 0.52056273248054302 },
    { field: "u", at: { x: 1, t: 1 }, value: 0.82436063535006407 },
    { field: "u", at: { x: 4, t: 1 }, value: 0.11268717330343314 },
  ],
  notes: ["The source is a function of x and t alone; it must not be formed from the computed solution."],
  sources: [
    {
      citation:
        "P. J. Roache, Code verification by the method of manufactured solutions, J. Fluids Eng. 124 (2002) 4-10 (the method; the profile is our own)",
      doi: "10.1115/1.1436090",
      isFromMemory: true,
    },
  ],
};
