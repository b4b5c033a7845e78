import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-03: advection and diffusion of a Gaussian that is wrapped round the interval. */
export const advectionDiffusionGaussian: ProblemDefinition = {
  slug: "advection-diffusion-gaussian",
  code: "P-03",
  title: "Advection and diffusion of a wrapped Gaussian",
  statement:
    "A narrow Gaussian moves at constant speed and spreads by diffusion on a periodic interval. The pulse starts with a standard deviation of a twentieth of the domain, so a grid must first resolve it before any order shows; from there on the balance between transport and diffusion is what is measured. The solution is the heat kernel with its periodic images.",
  keywords: ["advection", "diffusion", "Gaussian", "pulse", "heat kernel", "images"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [{ name: "x", a: 0, b: 1, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    { name: "c", value: 1, unit: "dimensionless", meaning: "speed of the pulse" },
    { name: "nu", value: 0.005, unit: "dimensionless", meaning: "diffusivity" },
    {
      name: "s0",
      value: 0.05,
      unit: "dimensionless",
      meaning: "standard deviation of the pulse at the start",
    },
  ],
  expressions: [
    { name: "s", expression: "sqrt(s0^2 + 2*nu*t)", meaning: "standard deviation of the pulse" },
    { name: "r", expression: "mod(x - c*t, 1) - 1/2", meaning: "distance from the nearest crest" },
  ],
  equations: [{ field: "u", identity: "u_t + c*u_x = nu*u_xx" }],
  initialTime: 0,
  initialConditions: [
    {
      field: "u",
      timeDerivative: 0,
      expression: "exp(-(x - 1/2)^2/(2*s0^2)) + exp(-(x + 1/2)^2/(2*s0^2)) + exp(-(x - 3/2)^2/(2*s0^2))",
    },
  ],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [0.7],
  exact: {
    kind: "expression",
    fields: { u: "s0/s*(exp(-r^2/(2*s^2)) + exp(-(r - 1)^2/(2*s^2)) + exp(-(r + 1)^2/(2*s^2)))" },
  },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [8, 10, 12, 14, 16, 18, 20, 22, 24, 28, 32, 36, 40, 48, 64, 96, 128, 192, 256, 512],
      "cell-centred": [32, 48, 64, 96, 128, 192, 256, 512],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0.2, t: 0.7 }, value: 0.51298917604257705 },
    { field: "u", at: { x: 0.3, t: 0.7 }, value: 0.30306247008067493 },
    { field: "u", at: { x: 0.7, t: 0.7 }, value: 1.980327961905178e-6 },
  ],
  notes: [
    "The pulse is the sum over all integers m of the Gaussians about 1/2 + c t + m. Of these the nearest crest and one image on either side are written out; the others are below 1e-50 at the final time.",
    "At the final time the pulse has not moved by a multiple of the node spacing of the suggested grids; otherwise aliased modes would be carried exactly and a Fourier error would be understated.",
  ],
  sources: [
    {
      citation: "H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford, 1959",
      isFromMemory: true,
    },
  ],
};
