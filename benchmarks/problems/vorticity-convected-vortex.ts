import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-09: two-dimensional Navier-Stokes equations in vorticity form, Taylor-Green vortices in a mean flow. */
export const vorticityConvectedVortex: ProblemDefinition = {
  slug: "vorticity-convected-vortex",
  code: "P-09",
  title: "Vorticity equation, convected Taylor-Green vortices",
  statement:
    "An array of decaying vortices is carried by a uniform flow through a doubly periodic square. The field u is the vorticity and psi the stream function of the vortices. Transport, diffusion and the Poisson equation for the stream function all enter, but the vortices do not transport themselves: the nonlinear term vanishes, in difference schemes too, so this problem cannot show a wrong Jacobian.",
  keywords: ["Navier-Stokes", "vorticity", "Taylor-Green", "stream function", "two-dimensional"],
  classification: {
    domain: "periodic",
    dimension: 2,
    isSteady: false,
    isLinear: false,
    smoothness: { kind: "entire" },
  },
  axes: [
    { name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" },
    { name: "y", a: 0, b: 2 * Math.PI, kind: "periodic" },
  ],
  fields: [
    { name: "u", values: "real", isScored: true },
    { name: "psi", values: "real", isScored: false },
  ],
  parameters: [
    { name: "U", value: 1, unit: "dimensionless", meaning: "mean velocity along x" },
    { name: "V", value: 0.5, unit: "dimensionless", meaning: "mean velocity along y" },
    { name: "nu", value: 0.05, unit: "dimensionless", meaning: "kinematic viscosity" },
  ],
  expressions: [],
  equations: [
    { field: "u", identity: "u_t + (U + psi_y)*u_x + (V - psi_x)*u_y = nu*u_xx + nu*u_yy" },
    { field: "psi", identity: "psi_xx + psi_yy = -u" },
  ],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "2*cos(x)*cos(y)" }],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [1],
  exact: {
    kind: "expression",
    fields: { u: "2*cos(x - U*t)*cos(y - V*t)*exp(-2*nu*t)", psi: "cos(x - U*t)*cos(y - V*t)*exp(-2*nu*t)" },
  },
  grids: {
    kinds: [periodicKinds, periodicKinds],
    suggested: { "uniform-periodic": [8, 12, 16, 24, 32, 48, 64, 128], "cell-centred": [16, 32, 64, 128] },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, y: 0, t: 1 }, value: 0.8580752063303608 },
    { field: "u", at: { x: 1, y: 0.5, t: 1 }, value: 1.809674836071919 },
    { field: "u", at: { x: 2, y: 3, t: 1 }, value: -0.7833353841146189 },
  ],
  notes: [
    "A Fourier method reaches round-off on every grid of four nodes or more, since the solution has one mode: for it this is a test of identity, not of convergence.",
    "Central differences exact in time give 2 cos(x - U s t) cos(y - V s t) exp(-2 nu q t) with the modified wavenumbers s and q of mode 1.",
  ],
  sources: [
    {
      citation:
        "G. I. Taylor and A. E. Green, Mechanism of the production of small eddies from large ones, Proc. R. Soc. A 158 (1937) 499-521",
      isFromMemory: true,
    },
    {
      citation:
        "C. Canuto, M. Y. Hussaini, A. Quarteroni and T. A. Zang, Spectral Methods: Evolution to Complex Geometries and Applications to Fluid Dynamics, Springer, 2007",
      isFromMemory: true,
    },
  ],
};
