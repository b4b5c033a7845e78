import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-05: Poisson equation on the unit square, Neumann on two sides and Dirichlet on the other two. */
export const poissonMixed2d: ProblemDefinition = {
  slug: "poisson-mixed-2d",
  code: "B-05",
  title: "Two-dimensional Poisson equation, Neumann and Dirichlet sides",
  statement:
    "The Poisson equation on the unit square with no flux through two sides and zero values on the other two. The solution is a product of a cosine and a sine, smooth up to the corners, so the two kinds of boundary condition meet without a singularity. The five-point scheme with ghost points reproduces the shape of the solution exactly and misses only its amplitude, by a factor known in closed form.",
  keywords: ["Poisson", "elliptic", "steady", "two-dimensional", "Neumann", "Dirichlet"],
  classification: {
    domain: "bounded",
    dimension: 2,
    isSteady: true,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [
    { name: "x", a: 0, b: 1, kind: "bounded" },
    { name: "y", a: 0, b: 1, kind: "bounded" },
  ],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [],
  expressions: [{ name: "f", expression: "2*pi^2*cos(pi*x)*sin(pi*y)", meaning: "right-hand side" }],
  equations: [{ field: "u", identity: "-u_xx - u_yy = f" }],
  initialTime: 0,
  initialConditions: [],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "neumann", alpha: "0", beta: "1", g: "0" },
    { field: "u", axis: "x", end: "b", kind: "neumann", alpha: "0", beta: "1", g: "0" },
    { field: "u", axis: "y", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
    { field: "u", axis: "y", end: "b", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
  ],
  kinks: [],
  outputTimes: [],
  exact: { kind: "expression", fields: { u: "cos(pi*x)*sin(pi*y)" } },
  grids: {
    kinds: [boundedKinds, boundedKinds],
    suggested: {
      uniform: [9, 17, 33, 65, 129],
      "cell-centred": [8, 16, 32, 64, 128],
      "chebyshev-lobatto": [6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 17, 19, 21],
      "chebyshev-gauss": [6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 17, 20],
      "legendre-lobatto": [6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 17, 20],
      "legendre-gauss": [6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 17, 20],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, y: 0.5 }, value: 1 },
    { field: "u", at: { x: 0.25, y: 0.25 }, value: 0.5 },
    { field: "u", at: { x: 0.7, y: 0.3 }, value: -0.47552825814757679 },
  ],
  notes: [
    "The five-point scheme with ghost points gives A u at the nodes, with A = pi^2 h^2/(4 sin^2(pi h/2)).",
  ],
  sources: [
    {
      citation:
        "R. J. LeVeque, Finite Difference Methods for Ordinary and Partial Differential Equations, SIAM, 2007, ch. 3",
      doi: "10.1137/1.9780898717839",
      isFromMemory: true,
    },
  ],
};
