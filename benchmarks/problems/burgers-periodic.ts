import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-04: viscous Burgers equation with a periodic Cole-Hopf solution in closed form. */
export const burgersPeriodic: ProblemDefinition = {
  slug: "burgers-periodic",
  code: "P-04",
  title: "Viscous Burgers equation, periodic Cole-Hopf solution",
  statement:
    "Quadratic advection steepens a wave while viscosity smooths it. The Cole-Hopf transformation turns the equation into the heat equation, and a heat solution of one mode above a constant gives a periodic solution in closed form. It is analytic in a strip of known width, so a spectral method converges at a geometric rate that can be compared with theory, and the aliasing of the quadratic term shows.",
  keywords: ["Burgers", "nonlinear advection", "viscosity", "Cole-Hopf", "aliasing"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: false,
    smoothness: { kind: "analytic", stripHalfWidth: Math.LN2 },
  },
  axes: [{ name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    { name: "nu", value: 0.1, unit: "dimensionless", meaning: "viscosity" },
    { name: "a", value: 0.8, unit: "dimensionless", meaning: "amplitude of the mode of the heat solution" },
  ],
  expressions: [],
  equations: [{ field: "u", identity: "u_t + d(u^2/2, x) = nu*u_xx" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "2*nu*a*sin(x)/(1 + a*cos(x))" }],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [1],
  exact: {
    kind: "expression",
    fields: { u: "2*nu*a*exp(-nu*t)*sin(x)/(1 + a*exp(-nu*t)*cos(x))" },
  },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [12, 16, 20, 24, 28, 32, 36, 40, 48, 56, 64, 72, 80, 96, 128, 192, 256, 512],
      "cell-centred": [32, 48, 64, 96, 128, 192, 256, 512],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 1, t: 1 }, value: 0.08757268108446892 },
    { field: "u", at: { x: 2, t: 1 }, value: 0.18839357533596631 },
    { field: "u", at: { x: 2.5, t: 1 }, value: 0.20625589710983507 },
  ],
  notes: [
    "The half-width of the strip of analyticity is arccosh(exp(nu t)/a): ln 2 at the start, 0.847834 at the final time. A Fourier method is seen to follow the later value, since viscosity damps the high modes of the start.",
    "Advective and conservative forms of the nonlinear term give different constants at the same order.",
  ],
  sources: [
    {
      citation:
        "J. D. Cole, On a quasi-linear parabolic equation occurring in aerodynamics, Quart. Appl. Math. 9 (1951) 225-236",
      isFromMemory: true,
    },
    {
      citation:
        "E. Hopf, The partial differential equation u_t + u u_x = mu u_xx, Comm. Pure Appl. Math. 3 (1950) 201-230",
      isFromMemory: true,
    },
    {
      citation:
        "E. R. Benton and G. W. Platzman, A table of solutions of the one-dimensional Burgers equation, Quart. Appl. Math. 30 (1972) 195-212",
      isFromMemory: true,
    },
  ],
};
